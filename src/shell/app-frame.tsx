import type { ReactNode } from "react";
import { NavLink } from "react-router-dom";
import { classNames } from "../ui/class-names.ts";
import { Toasts } from "../ui/toasts.tsx";
import { Footer } from "./footer.tsx";
import { KeyboardShortcuts } from "./keyboard-shortcuts.tsx";
import type { Place } from "./place.ts";
import { TopBar } from "./top-bar.tsx";

export interface AppFrameProps {
  places: readonly Place[];
  /** The right end of the top bar: the shop's menu, or the way to sign in. */
  corner: ReactNode;
  /** Everything shown is invented. */
  demo: boolean;
  children: ReactNode;
}

/** What stands around every page: bars, banner, messages, and a way past them for the keyboard. */
export function AppFrame({ places, corner, demo, children }: AppFrameProps) {
  return (
    <div className="flex min-h-dvh flex-col [--bar-height:3.5rem]">
      <a
        href="#page"
        data-chrome=""
        className="sr-only z-50 rounded bg-action px-4 py-3 font-bold text-on-action focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        Skip to the page
      </a>
      <TopBar places={places} corner={corner} />
      {demo ? <DemoBanner /> : null}
      <main
        id="page"
        tabIndex={-1}
        className="mx-auto w-full max-w-[77rem] flex-1 px-4 pt-6 pb-12 outline-none md:px-14 md:pt-7 md:pb-16"
      >
        {children}
      </main>
      <Footer aboveBar={places.length > 0} />
      {places.length > 0 ? <BottomBar places={places} /> : null}
      <Toasts />
      <KeyboardShortcuts />
    </div>
  );
}

function DemoBanner() {
  return (
    <aside
      aria-label="Demo"
      data-chrome=""
      className="border-b border-line bg-action-soft px-4 py-1 text-center text-sm text-ink"
    >
      Demo data: every shop, person and number here is invented.
    </aside>
  );
}

function BottomBar({ places }: { places: readonly Place[] }) {
  return (
    <nav
      aria-label="Places"
      data-chrome=""
      className="fixed inset-x-0 bottom-0 z-20 flex border-t border-line bg-surface pb-[env(safe-area-inset-bottom)] md:hidden"
    >
      {places.map(({ label, to, icon: Icon }) => (
        <NavLink
          key={to}
          to={to}
          className={({ isActive }) =>
            classNames(
              "-mt-px flex min-h-14 flex-1 flex-col items-center justify-center border-t-[3px] text-sm font-bold -outline-offset-2",
              isActive ? "border-action text-ink" : "border-transparent text-muted",
            )
          }
        >
          <Icon aria-hidden="true" size={20} />
          {label}
        </NavLink>
      ))}
    </nav>
  );
}
