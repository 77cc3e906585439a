import { and, asc, desc, eq, inArray, isNull, type SQL, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { isNewestVersion } from "#server/db/newest-version.ts";
import { machines } from "#server/db/schema/machines.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { shares } from "#server/db/schema/shares.ts";
import { testCuts } from "#server/db/schema/test-cuts.ts";
import { users } from "#server/db/schema/users.ts";

export type VersionRow = typeof recipeVersions.$inferSelect;
export type NewVersion = Omit<typeof recipeVersions.$inferInsert, "shopId" | "changedAt">;
export type RecipeRow = Awaited<ReturnType<typeof selectRecipes>>[number];
export type LockedRecipe = Pick<typeof recipes.$inferSelect, "id" | "state" | "currentVersion">;

/** Who saved a version is named to their own shop only, and no longer once they have left it. */
const isMemberStill = and(
  eq(memberships.userId, recipeVersions.changedBy),
  eq(memberships.shopId, recipeVersions.shopId),
);

const ofRecipe = sql`${testCuts.recipeId} = ${recipes.id} and ${testCuts.shopId} = ${recipes.shopId}`;

/** Recipes at their newest version; `place` says where each stands in a list's order. The counts are sub-selects so that a page counts for its own rows, not for the book. */
export function selectRecipes(tx: Db, shopId: string, filter?: SQL, place: SQL<string[]> = sql`'{}'::text[]`) {
  return tx
    .select({
      id: recipes.id,
      state: recipes.state,
      machineName: machines.name,
      sharing: shares.level,
      changedBy: users.name,
      testCuts: sql<number>`(select count(*)::integer from ${testCuts} where ${ofRecipe})`,
      acceptableTestCuts: sql<number>`(select count(*)::integer from ${testCuts} where ${ofRecipe} and ${testCuts.acceptable})`,
      version: recipeVersions,
      place,
    })
    .from(recipes)
    .innerJoin(recipeVersions, isNewestVersion)
    .innerJoin(machines, eq(machines.id, recipeVersions.machineId))
    .leftJoin(shares, eq(shares.recipeId, recipes.id))
    .leftJoin(memberships, isMemberStill)
    .leftJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(recipes.shopId, shopId), filter))
    .$dynamic();
}

export async function findRecipe(tx: Db, shopId: string, id: string): Promise<RecipeRow | undefined> {
  const [row] = await selectRecipes(tx, shopId, eq(recipes.id, id));
  return row;
}

/** Holds the recipe for this transaction: of two who change it at once, the second sees what the first did. */
export async function lockRecipe(tx: Db, shopId: string, id: string): Promise<LockedRecipe | undefined> {
  const [row] = await tx
    .select({ id: recipes.id, state: recipes.state, currentVersion: recipes.currentVersion })
    .from(recipes)
    .where(and(eq(recipes.id, id), eq(recipes.shopId, shopId)))
    .for("no key update");
  return row;
}

export async function insertRecipe(tx: Db, shopId: string): Promise<string> {
  const [row] = await tx.insert(recipes).values({ shopId, currentVersion: 1 }).returning({ id: recipes.id });
  return row!.id; // INSERT ... RETURNING of one row gives one row
}

export async function insertVersion(tx: Db, shopId: string, values: NewVersion): Promise<void> {
  await tx.insert(recipeVersions).values({ ...values, shopId });
}

/** `changedAt` follows the newest version alone: retiring or proving a recipe does not move it up the list. */
export async function pointToVersion(
  tx: Db,
  shopId: string,
  { id, state, currentVersion }: LockedRecipe,
): Promise<void> {
  await tx
    .update(recipes)
    .set({ state, currentVersion, changedAt: sql`now()` })
    .where(and(eq(recipes.id, id), eq(recipes.shopId, shopId)));
}

export async function updateState(tx: Db, shopId: string, id: string, state: LockedRecipe["state"]): Promise<void> {
  await tx
    .update(recipes)
    .set({ state })
    .where(and(eq(recipes.id, id), eq(recipes.shopId, shopId)));
}

export async function findVersion(
  tx: Db,
  shopId: string,
  recipeId: string,
  number: number,
): Promise<VersionRow | undefined> {
  const [row] = await tx
    .select()
    .from(recipeVersions)
    .where(
      and(eq(recipeVersions.recipeId, recipeId), eq(recipeVersions.shopId, shopId), eq(recipeVersions.number, number)),
    );
  return row;
}

/** Newest first; of the whole book where no recipe is named. */
export function listVersions(tx: Db, shopId: string, recipeId?: string) {
  return tx
    .select({ version: recipeVersions, changedBy: users.name })
    .from(recipeVersions)
    .leftJoin(memberships, isMemberStill)
    .leftJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(recipeVersions.shopId, shopId), recipeId ? eq(recipeVersions.recipeId, recipeId) : undefined))
    .orderBy(asc(recipeVersions.recipeId), desc(recipeVersions.number));
}

/** The first proof stays: a later acceptable cut does not move its date. */
export async function markProven(
  tx: Db,
  shopId: string,
  recipeId: string,
  numbers: readonly number[],
  provenAt: Date,
): Promise<void> {
  await tx
    .update(recipeVersions)
    .set({ provenAt })
    .where(
      and(
        eq(recipeVersions.recipeId, recipeId),
        eq(recipeVersions.shopId, shopId),
        inArray(recipeVersions.number, [...numbers]),
        isNull(recipeVersions.provenAt),
      ),
    );
}

/** The whole book, ordered as a person looks things up: material, thickness, nozzle. */
export function listBook(tx: Db, shopId: string): Promise<RecipeRow[]> {
  return selectRecipes(tx, shopId).orderBy(
    asc(recipeVersions.material),
    asc(recipeVersions.thicknessMm),
    asc(recipeVersions.nozzleMm),
    asc(recipes.id),
  );
}
