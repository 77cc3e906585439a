import { z } from "zod";
import type { SortKeyType } from "#server/db/keyset.ts";
import { materials } from "#shared/materials/materials.ts";
import { ProblemError } from "./problem.ts";

/** What PostgreSQL will read back without an error; a cursor is the caller's to garble. */
const place: Record<SortKeyType, z.ZodType<string>> = {
  "double precision": z.string().regex(/^(-?Infinity|\d{1,9}(\.\d{1,17})?)$/),
  timestamptz: z.iso.datetime(),
  text: z.string().refine((text) => !text.includes("\0")),
  material: z.enum(materials),
  uuid: z.uuid(),
};

/**
 * One page of rows asked for with one row more than fits: that row tells whether another page follows.
 * `list` names the list and its order: a cursor of another one does not fit.
 */
export function takePage<Row extends { place: string[] }>(
  rows: readonly Row[],
  limit: number,
  list: string,
): { shown: Row[]; next: string | null } {
  const shown = rows.slice(0, limit);
  const last = rows.length > limit ? shown.at(-1) : undefined;
  return { shown, next: last ? Buffer.from(JSON.stringify([list, ...last.place])).toString("base64url") : null };
}

/** The place a page starts after; undefined for the first page. */
export function readCursor(
  cursor: string | undefined,
  list: string,
  types: readonly SortKeyType[],
): string[] | undefined {
  if (cursor === undefined) return undefined;
  const read = z.array(z.string()).safeParse(parseJson(Buffer.from(cursor, "base64url").toString()));
  const [name, ...texts] = read.data ?? [];
  const fits = texts.length === types.length && types.every((type, i) => place[type].safeParse(texts[i]).success);
  if (name === list && fits) return texts;
  const detail = "This is no place in the list as it is sorted now. Start again at the first page";
  throw new ProblemError("invalid-request", { errors: [{ pointer: "?cursor", detail }] });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
