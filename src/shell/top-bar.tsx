import type { ReactNode } from "react";
import { Link, NavLink } from "react-router-dom";
import { classNames } from "../ui/class-names.ts";
import { Wordmark } from "../ui/wordmark.tsx";
import type { Place } from "./place.ts";

export function TopBar({ places, corner }: { places: readonly Place[]; corner: ReactNode }) {
  return (
    <header
      data-chrome=""
      className="sticky top-0 z-20 flex h-14 items-stretch border-b border-line bg-surface px-4 md:px-7"
    >
      <Link to="/" aria-label="Tempermark, first page" className="flex shrink-0 items-center rounded">
        <Wordmark />
      </Link>
      <nav aria-label="Places" className="ml-6 hidden md:flex lg:ml-7">
        {places.map(({ label, to }) => (
          <NavLink
            key={to}
            to={to}
            className={({ isActive }) =>
              classNames(
                "-mb-px flex items-center border-y-[3px] border-t-transparent px-2.5 text-base font-bold -outline-offset-4 lg:px-3.5",
                isActive ? "border-b-action text-ink" : "border-b-transparent text-soft hover:text-ink",
              )
            }
          >
            {label}
          </NavLink>
        ))}
      </nav>
      <div className="ml-auto flex min-w-0 items-center">{corner}</div>
    </header>
  );
}
