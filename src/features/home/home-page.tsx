import type { ReactNode } from "react";
import { Navigate, useSearchParams } from "react-router-dom";
import { useSession } from "../../shell/session.queries.ts";
import { Landing } from "./landing.tsx";
import { Suspended } from "./suspended.tsx";

/** The first page: each person to their own work, visitors to what this is. `withoutShop` is for the ones in between. */
export function HomePage({ withoutShop }: { withoutShop: ReactNode }) {
  const { user, shop, admin } = useSession();
  const [params] = useSearchParams();
  if (!user) return <Landing signIn={params.get("sign-in")} />;
  if (shop?.state === "active") return <Navigate to="/recipes" replace />;
  if (shop) return <Suspended shopName={shop.name} />;
  if (admin) return <Navigate to="/members" replace />;
  return withoutShop;
}
