import { type ReactNode, Suspense, useEffect } from "react";
import { Outlet, ScrollRestoration } from "react-router-dom";
import type { Session } from "#shared/contracts/accounts.ts";
import { Skeleton } from "../ui/skeleton.tsx";
import { AppFrame } from "./app-frame.tsx";
import { menuLinksFor, placesFor } from "./places.ts";
import { usePreferences, useSession, useSignOut } from "./session.queries.ts";
import { ShopMenu } from "./shop-menu.tsx";
import { SignInLink } from "./sign-in-link.tsx";

/** The frame around every page, filled from the session. */
export function RootLayout() {
  return (
    <Suspense fallback={<BareFrame>{<Skeleton />}</BareFrame>}>
      <SessionFrame />
    </Suspense>
  );
}

/** The frame before anybody is known, and around problems that leave nothing known. */
export function BareFrame({ children }: { children: ReactNode }) {
  return (
    <AppFrame places={[]} corner={null} demo={false}>
      {children}
    </AppFrame>
  );
}

function SessionFrame() {
  const session = useSession();
  useTheme(session.theme);
  return (
    <AppFrame places={placesFor(session)} corner={<Corner session={session} />} demo={session.demo}>
      <Suspense fallback={<Skeleton lines={8} />}>
        <Outlet />
      </Suspense>
      <ScrollRestoration />
    </AppFrame>
  );
}

function Corner({ session }: { session: Session }) {
  const preferences = usePreferences();
  const signOut = useSignOut();
  if (!session.user) return <SignInLink />;
  return (
    <ShopMenu
      session={session}
      links={menuLinksFor(session)}
      onUnits={(units) => preferences.mutate({ units })}
      onTheme={(theme) => preferences.mutate({ theme })}
      onSignOut={() => signOut.mutate()}
    />
  );
}

function useTheme(theme: Session["theme"]): void {
  useEffect(() => {
    document.documentElement.dataset.theme = theme;
  }, [theme]);
}
