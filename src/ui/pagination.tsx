import { Link, useLocation, useSearchParams } from "react-router-dom";
import { buttonClasses } from "./button.tsx";

export interface PaginationProps {
  /** Cursor of the following page; null on the last. */
  next: string | null;
  /** How many there are on this page and in all, in words: "50 of 312 recipes". */
  summary?: string;
  /** Words for the two ways; a list that is not by time says otherwise. */
  backLabel?: string;
  nextLabel?: string;
}

interface Trail {
  cursors: string[];
}

const cursorParam = "cursor";

/**
 * Links through a list by cursor, kept in the URL so that a page can be bookmarked and opened in a tab.
 * A cursor only leads onward; the way back is remembered in the history entry, and without it leads to the first page.
 */
export function Pagination({ next, summary, backLabel = "Newer", nextLabel = "Older" }: PaginationProps) {
  const [params] = useSearchParams();
  const location = useLocation();
  const current = params.get(cursorParam);
  const trail = (location.state as Trail | null)?.cursors ?? [];

  function pageAt(cursor: string | null | undefined): string {
    const query = new URLSearchParams(params);
    query.delete(cursorParam);
    if (cursor) query.set(cursorParam, cursor);
    return `?${query}`;
  }

  if (current === null && next === null && !summary) return null;
  return (
    <nav aria-label="Pages" className="mt-4 flex items-center gap-2 print:hidden">
      <p className="mr-auto text-sm text-muted">{summary}</p>
      {current === null ? null : (
        <Link
          to={pageAt(trail.at(-1))}
          state={{ cursors: trail.slice(0, -1) }}
          rel="prev"
          className={buttonClasses("secondary", true)}
        >
          {backLabel}
        </Link>
      )}
      {next === null ? null : (
        <Link
          to={pageAt(next)}
          state={{ cursors: current === null ? [] : [...trail, current] }}
          rel="next"
          className={buttonClasses("secondary", true)}
        >
          {nextLabel}
        </Link>
      )}
    </nav>
  );
}
