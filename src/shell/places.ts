import { BookOpen, ChartNoAxesColumn, ClipboardCheck, Compass, Inbox, Library, Users } from "lucide-react";
import type { Session } from "#shared/contracts/accounts.ts";
import type { Place } from "./app-frame.tsx";

const shopPlaces: readonly Place[] = [
  { label: "Recipes", to: "/recipes", icon: BookOpen },
  { label: "Test cuts", to: "/test-cuts", icon: ClipboardCheck },
  { label: "Peers", to: "/peers", icon: ChartNoAxesColumn },
  { label: "Start", to: "/start", icon: Compass },
];

const adminPlaces: readonly Place[] = [
  { label: "Members", to: "/members", icon: Users },
  { label: "Applications", to: "/applications", icon: Inbox },
  { label: "Editions", to: "/editions", icon: Library },
];

/** Where this person has work to do. */
export function placesFor(session: Pick<Session, "shop" | "admin">): readonly Place[] {
  if (session.shop?.state === "active") return shopPlaces;
  return session.admin ? adminPlaces : [];
}
