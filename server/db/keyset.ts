import { type SQL, sql } from "drizzle-orm";

export type SortKeyType = "double precision" | "timestamptz" | "text" | "material" | "uuid";

/** One term of a list's order. `value` is never null, or rows would be lost between two pages. */
export interface SortKey {
  value: SQL;
  type: SortKeyType;
}

type Order = "asc" | "desc";

/** A number that may be missing, placed at the end of the list in either order. */
export function missingLast(column: SQL, order: Order): SortKey {
  const end = order === "asc" ? "Infinity" : "-Infinity";
  return { value: sql`coalesce(${column}, ${end}::double precision)`, type: "double precision" };
}

export function orderedBy(keys: readonly SortKey[], order: Order): SQL {
  const direction = sql.raw(order);
  return sql.join(
    keys.map(({ value }) => sql`${value} ${direction}`),
    sql`, `,
  );
}

/** Where a row stands in the order, as texts that read back exactly: times to the microsecond, whatever the session's zone. */
export function placeOf(keys: readonly SortKey[]): SQL<string[]> {
  const texts = keys.map(({ value, type }) =>
    type === "timestamptz"
      ? sql`to_char(${value} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"')`
      : sql`${value}::text`,
  );
  return sql`array[${sql.join(texts, sql`, `)}]`;
}

/** Rows after a place. Keyset rather than offset: a row added or changed meanwhile repeats or hides no other. */
export function isAfter(keys: readonly SortKey[], place: readonly string[], order: Order): SQL {
  const values = keys.map(({ value }) => value);
  const bounds = keys.map(({ type }, i) => sql`${place[i]}::${sql.raw(type)}`);
  const comparison = order === "asc" ? sql`>` : sql`<`;
  return sql`(${sql.join(values, sql`, `)}) ${comparison} (${sql.join(bounds, sql`, `)})`;
}
