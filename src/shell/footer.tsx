import { Link } from "react-router-dom";
import { classNames } from "../ui/class-names.ts";

const links = [
  { label: "Method", to: "/method" },
  { label: "Cautions", to: "/cautions" },
];

/** For everybody, signed in or not: how the figures are made, and what can hurt. */
export function Footer({ aboveBar }: { aboveBar: boolean }) {
  return (
    <footer
      data-chrome=""
      className={classNames(
        "border-t border-line px-4 md:px-14 md:pb-0",
        aboveBar && "pb-[calc(3.5rem+env(safe-area-inset-bottom))]",
      )}
    >
      <nav aria-label="About" className="mx-auto flex w-full max-w-page flex-wrap gap-x-6 py-2 text-sm">
        {links.map(({ label, to }) => (
          <Link
            key={to}
            to={to}
            className="inline-flex min-h-9 items-center text-muted underline-offset-2 hover:text-ink hover:underline pointer-coarse:min-h-touch"
          >
            {label}
          </Link>
        ))}
      </nav>
    </footer>
  );
}
