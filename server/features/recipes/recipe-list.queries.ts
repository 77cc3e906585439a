import { and, count, eq, gte, ilike, inArray, isNull, lt, or, type SQL, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { isAfter, missingLast, orderedBy, placeOf, type SortKey } from "#server/db/keyset.ts";
import { isNewestVersion } from "#server/db/newest-version.ts";
import { machines } from "#server/db/schema/machines.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { shares } from "#server/db/schema/shares.ts";
import type { RecipeQuery } from "#shared/contracts/recipes.ts";
import type { Material } from "#shared/materials/materials.ts";
import { type RecipeRow, selectRecipes } from "./recipes.queries.ts";

/** What is asked of the list, already in the terms of the tables. */
export interface RecipeFilter {
  /** Each word must be found in grade, note or machine name, or name one of its materials. */
  words: readonly { word: string; materials: readonly Material[] }[];
  material: Material | undefined;
  machineId: string | undefined;
  state: RecipeQuery["state"];
  sharing: RecipeQuery["sharing"];
  /** Half open: `from` belongs to it. */
  thicknessMm: { from: number; to: number } | undefined;
  /** Nominal, to 0.1 mm. */
  nozzleMm: number | undefined;
}

type Sorting = Pick<RecipeQuery, "sort" | "order">;

const material: SortKey = { value: sql`${recipeVersions.material}`, type: "material" };
const thickness: SortKey = { value: sql`${recipeVersions.thicknessMm}`, type: "double precision" };
const nozzle: SortKey = { value: sql`${recipeVersions.nozzleMm}`, type: "double precision" };
const machine: SortKey = { value: sql`lower(${machines.name})`, type: "text" };
const changed: SortKey = { value: sql`${recipes.changedAt}`, type: "timestamptz" };
const id: SortKey = { value: sql`${recipes.id}`, type: "uuid" };

/** The id comes last in every order, so that no two rows share a place. */
export function sortKeysOf({ sort, order }: Sorting): SortKey[] {
  const setpoint = (column: SQL) => [missingLast(column, order), id];
  switch (sort) {
    case "changed":
      return [changed, id];
    case "material":
      return [material, thickness, nozzle, id];
    case "thickness":
      return [thickness, nozzle, id];
    case "nozzle":
      return [nozzle, thickness, id];
    case "machine":
      return [machine, material, thickness, id];
    case "current":
      return setpoint(sql`${recipeVersions.currentA}`);
    case "feed":
      return setpoint(sql`${recipeVersions.feedMmMin}`);
    case "voltage":
      return setpoint(sql`${recipeVersions.arcVoltageV}`);
    case "pressure":
      return setpoint(sql`${recipeVersions.pressureBar}`);
  }
}

function matches(filter: RecipeFilter): SQL | undefined {
  const { thicknessMm: band, nozzleMm, sharing } = filter;
  return and(
    filter.material && eq(recipeVersions.material, filter.material),
    filter.machineId ? eq(recipeVersions.machineId, filter.machineId) : undefined,
    filter.state && eq(recipes.state, filter.state),
    sharing && (sharing === "private" ? isNull(shares.level) : eq(shares.level, sharing)),
    band && and(gte(recipeVersions.thicknessMm, band.from), lt(recipeVersions.thicknessMm, band.to)),
    nozzleMm === undefined ? undefined : sql`round(${recipeVersions.nozzleMm}::numeric, 1) = ${nozzleMm}::numeric`,
    ...filter.words.map(({ word, materials }) => containsWord(word, materials)),
  );
}

function containsWord(word: string, materials: readonly Material[]): SQL | undefined {
  const pattern = `%${word.replaceAll(/[\\%_]/g, "\\$&")}%`;
  return or(
    ilike(recipeVersions.grade, pattern),
    ilike(recipeVersions.note, pattern),
    ilike(machines.name, pattern),
    materials.length > 0 ? inArray(recipeVersions.material, [...materials]) : undefined,
  );
}

export function listRecipes(
  tx: Db,
  shopId: string,
  filter: RecipeFilter,
  page: Sorting & { after: readonly string[] | undefined; limit: number },
): Promise<RecipeRow[]> {
  const keys = sortKeysOf(page);
  const beyond = page.after && isAfter(keys, page.after, page.order);
  return selectRecipes(tx, shopId, and(matches(filter), beyond), placeOf(keys))
    .orderBy(orderedBy(keys, page.order))
    .limit(page.limit);
}

export async function countRecipes(tx: Db, shopId: string, filter: RecipeFilter): Promise<number> {
  const [row] = await tx
    .select({ recipes: count() })
    .from(recipes)
    .innerJoin(recipeVersions, isNewestVersion)
    .innerJoin(machines, eq(machines.id, recipeVersions.machineId))
    .leftJoin(shares, eq(shares.recipeId, recipes.id))
    .where(and(eq(recipes.shopId, shopId), matches(filter)));
  return row!.recipes; // an aggregate without groups gives one row
}
