import { and, asc, count, eq, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { isNewestVersion } from "#server/db/newest-version.ts";
import { machines } from "#server/db/schema/machines.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";

export type MachineRow = typeof machines.$inferSelect;
export type NewMachine = typeof machines.$inferInsert;

export function listMachines(tx: Db, shopId: string): Promise<MachineRow[]> {
  return tx.select().from(machines).where(eq(machines.shopId, shopId)).orderBy(asc(machines.name));
}

export async function findMachine(tx: Db, shopId: string, id: string): Promise<MachineRow | undefined> {
  const [row] = await tx
    .select()
    .from(machines)
    .where(and(eq(machines.id, id), eq(machines.shopId, shopId)));
  return row;
}

/** Recipes whose newest version is for each machine. */
export async function countRecipesByMachine(tx: Db, shopId: string): Promise<Map<string, number>> {
  const rows = await tx
    .select({ machineId: recipeVersions.machineId, recipes: count() })
    .from(recipes)
    .innerJoin(recipeVersions, isNewestVersion)
    .where(eq(recipes.shopId, shopId))
    .groupBy(recipeVersions.machineId);
  return new Map(rows.map((row) => [row.machineId, row.recipes]));
}

export async function insertMachine(tx: Db, values: NewMachine): Promise<MachineRow> {
  const [row] = await tx.insert(machines).values(values).returning();
  return row!; // INSERT ... RETURNING of one row gives one row
}

/** Undefined when the machine is no longer at `baseVersion`. */
export async function updateMachine(
  tx: Db,
  shopId: string,
  id: string,
  baseVersion: number,
  values: Omit<NewMachine, "shopId" | "id">,
): Promise<MachineRow | undefined> {
  const [row] = await tx
    .update(machines)
    .set({ ...values, version: baseVersion + 1, updatedAt: sql`now()` })
    .where(and(eq(machines.id, id), eq(machines.shopId, shopId), eq(machines.version, baseVersion)))
    .returning();
  return row;
}

export async function deleteMachine(tx: Db, shopId: string, id: string): Promise<boolean> {
  const gone = await tx
    .delete(machines)
    .where(and(eq(machines.id, id), eq(machines.shopId, shopId)))
    .returning({ id: machines.id });
  return gone.length > 0;
}
