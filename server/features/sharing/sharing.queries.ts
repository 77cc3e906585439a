import { and, asc, desc, eq, isNotNull, ne, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { isNewestVersion } from "#server/db/newest-version.ts";
import { machines } from "#server/db/schema/machines.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { shares } from "#server/db/schema/shares.ts";
import { shops } from "#server/db/schema/shops.ts";
import { users } from "#server/db/schema/users.ts";

export type ShareRow = typeof shares.$inferSelect;

export async function findShare(tx: Db, shopId: string, recipeId: string): Promise<ShareRow | undefined> {
  const [row] = await tx
    .select()
    .from(shares)
    .where(and(eq(shares.recipeId, recipeId), eq(shares.shopId, shopId)));
  return row;
}

export async function saveShare(tx: Db, values: Omit<ShareRow, "sharedAt">): Promise<void> {
  const { level, publicText } = values;
  await tx
    .insert(shares)
    .values(values)
    .onConflictDoUpdate({ target: shares.recipeId, set: { level, publicText, sharedAt: sql`now()` } });
}

export async function deleteShare(tx: Db, shopId: string, recipeId: string): Promise<void> {
  await tx.delete(shares).where(and(eq(shares.recipeId, recipeId), eq(shares.shopId, shopId)));
}

/** Shares with words for others. */
export function listTexts(tx: Db, shopId: string): Promise<ShareRow[]> {
  return tx
    .select()
    .from(shares)
    .where(and(eq(shares.shopId, shopId), ne(shares.publicText, "")));
}

export async function emptyText(tx: Db, shopId: string, recipeId: string): Promise<void> {
  await tx
    .update(shares)
    .set({ publicText: "" })
    .where(and(eq(shares.recipeId, recipeId), eq(shares.shopId, shopId)));
}

export async function findShopName(tx: Db, shopId: string): Promise<string> {
  const [row] = await tx.select({ name: shops.name }).from(shops).where(eq(shops.id, shopId));
  return row!.name; // asked of the actor's own shop
}

export async function listMachineNames(tx: Db, shopId: string): Promise<string[]> {
  const rows = await tx.select({ name: machines.name }).from(machines).where(eq(machines.shopId, shopId));
  return rows.map((row) => row.name);
}

export async function listPeopleNames(tx: Db, shopId: string): Promise<string[]> {
  const rows = await tx
    .select({ name: users.name })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.shopId, shopId))
    .orderBy(asc(users.name));
  return rows.map((row) => row.name);
}

/** Shared, proven recipes of one machine, the newest proof first: of each peer group the first one counts. */
export function listCountable(tx: Db, shopId: string, machineId: string) {
  return tx
    .select({
      recipeId: recipes.id,
      material: recipeVersions.material,
      thicknessMm: recipeVersions.thicknessMm,
      nozzleMm: recipeVersions.nozzleMm,
      gas: recipeVersions.processGas,
    })
    .from(shares)
    .innerJoin(recipes, and(eq(recipes.id, shares.recipeId), eq(recipes.state, "proven")))
    .innerJoin(recipeVersions, isNewestVersion)
    .where(and(eq(shares.shopId, shopId), eq(recipeVersions.machineId, machineId), isNotNull(recipeVersions.provenAt)))
    .orderBy(desc(recipeVersions.provenAt), asc(recipes.id));
}

/** When the version was proven: an edition dates a listed recipe by the quarter of it. */
export async function findProvenAt(tx: Db, shopId: string, recipeId: string, number: number): Promise<Date | null> {
  const [row] = await tx
    .select({ provenAt: recipeVersions.provenAt })
    .from(recipeVersions)
    .where(
      and(eq(recipeVersions.recipeId, recipeId), eq(recipeVersions.shopId, shopId), eq(recipeVersions.number, number)),
    );
  return row?.provenAt ?? null;
}
