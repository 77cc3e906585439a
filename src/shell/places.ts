import { BookOpen, ChartNoAxesColumn, ClipboardCheck, Compass, Inbox, Library, Users } from "lucide-react";
import type { Session } from "#shared/contracts/accounts.ts";
import { bookFiles } from "#shared/contracts/book-files.ts";
import type { Place } from "./place.ts";
import type { MenuLink } from "./shop-menu.tsx";

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

/** What the menu in the corner adds: the shop's own things, out of the way of daily work. */
export function menuLinksFor(session: Pick<Session, "shop" | "admin">): readonly MenuLink[] {
  const network = session.admin && session.shop ? adminPlaces.map(({ label, to }) => ({ label, to })) : [];
  if (session.shop?.state !== "active") return network;
  return [
    { label: "Machines", to: "/machines" },
    { label: "Export the book (table)", to: bookFiles.csv, download: true },
    { label: "Export the book (whole)", to: bookFiles.json, download: true },
    ...network,
  ];
}
