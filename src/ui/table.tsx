import { ArrowDown, ArrowUp } from "lucide-react";
import type { ReactNode } from "react";
import { classNames } from "./class-names.ts";
import { usePhone } from "./use-media-query.ts";

export interface Column<Row> {
  key: string;
  header: string;
  /** The header is for screen readers only, where the cells say enough to the eye. */
  hideHeader?: boolean;
  /** The unit of the whole column, said once in its header. */
  unit?: string;
  cell: (row: Row) => ReactNode;
  /** Right-aligned, digits under digits. */
  numeric?: boolean;
  sortable?: boolean;
  /** Names the row for screen readers; one column at most. */
  rowHeader?: boolean;
}

export interface Sort {
  key: string;
  direction: "asc" | "desc";
}

export interface TableProps<Row> {
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  sort?: Sort;
  onSort?: (sort: Sort) => void;
  /** On a phone each row is a card of its own. */
  renderCard?: (row: Row) => ReactNode;
}

export function Table<Row>({ caption, columns, rows, rowKey, sort, onSort, renderCard }: TableProps<Row>) {
  const phone = usePhone();
  if (phone && renderCard) {
    return (
      <ul aria-label={caption} className="space-y-3">
        {rows.map((row) => (
          <li key={rowKey(row)} className="rounded border border-line bg-surface p-4">
            {renderCard(row)}
          </li>
        ))}
      </ul>
    );
  }
  return (
    // The page scrolls, not the table, so that the header can stick below the top bar; narrow screens scroll it sideways.
    <div className="max-lg:overflow-x-auto">
      <table className="w-full border-separate border-spacing-0 text-base">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <Header key={column.key} column={column} sort={sort} onSort={onSort} />
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowKey(row)} className="hover:bg-surface">
              {columns.map((column) => (
                <Cell key={column.key} column={column} row={row} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

const cellClasses = "border-b border-line px-3 first:pl-0 last:pr-0 print:static";

function Cell<Row>({ column, row }: { column: Column<Row>; row: Row }) {
  const classes = classNames(cellClasses, "py-2 align-middle", column.numeric ? "figures text-right" : "text-left");
  if (!column.rowHeader) return <td className={classes}>{column.cell(row)}</td>;
  return (
    <th scope="row" className={classNames(classes, "font-bold")}>
      {column.cell(row)}
    </th>
  );
}

const ariaSort = { asc: "ascending", desc: "descending" } as const;

interface HeaderProps<Row> {
  column: Column<Row>;
  sort: Sort | undefined;
  onSort: ((sort: Sort) => void) | undefined;
}

function Header<Row>({ column, sort, onSort }: HeaderProps<Row>) {
  const sorted = sort?.key === column.key ? sort.direction : undefined;
  const Arrow = sorted === "desc" ? ArrowDown : ArrowUp;
  const words = (
    <>
      {column.header}
      {column.unit ? <span className="font-normal text-muted">{column.unit}</span> : null}
    </>
  );
  const layout = classNames("inline-flex items-center gap-1", column.numeric && "flex-row-reverse");

  return (
    <th
      scope="col"
      aria-sort={column.sortable && onSort ? (sorted ? ariaSort[sorted] : "none") : undefined}
      className={classNames(
        cellClasses,
        "sticky top-(--bar-height) z-10 bg-page text-sm font-bold whitespace-nowrap max-lg:static",
        column.numeric ? "text-right" : "text-left",
      )}
    >
      {column.sortable && onSort ? (
        <button
          type="button"
          onClick={() => onSort({ key: column.key, direction: sorted === "asc" ? "desc" : "asc" })}
          className={classNames(layout, "min-h-10 hover:text-action")}
        >
          <span className="inline-flex gap-1">{words}</span>
          <Arrow aria-hidden="true" size={14} className={sorted ? undefined : "invisible"} />
        </button>
      ) : (
        <span className={column.hideHeader ? "sr-only" : "inline-flex min-h-10 items-center gap-1"}>{words}</span>
      )}
    </th>
  );
}
