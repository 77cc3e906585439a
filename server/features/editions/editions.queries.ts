import { and, asc, desc, eq, inArray, lt, ne, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { editionGroups, listedRecipes } from "#server/db/schema/edition-groups.ts";
import { editions } from "#server/db/schema/editions.ts";
import type { Material, ProcessGas } from "#shared/materials/materials.ts";

export type EditionRow = typeof editions.$inferSelect;

export async function findEdition(tx: Db, id: string): Promise<EditionRow | undefined> {
  const [row] = await tx.select().from(editions).where(eq(editions.id, id));
  return row;
}

export async function findLastPublished(tx: Db): Promise<EditionRow | undefined> {
  const [row] = await tx
    .select()
    .from(editions)
    .where(eq(editions.state, "published"))
    .orderBy(desc(editions.number))
    .limit(1);
  return row;
}

export async function findNewestBuilt(tx: Db): Promise<EditionRow | undefined> {
  const [row] = await tx
    .select()
    .from(editions)
    .where(eq(editions.state, "built"))
    .orderBy(desc(editions.number))
    .limit(1);
  return row;
}

/** Newest first. */
export function listEditions(tx: Db): Promise<EditionRow[]> {
  return tx.select().from(editions).orderBy(desc(editions.number));
}

/** Day each published edition came out, by its number. */
export async function listPublicationDays(tx: Db): Promise<Map<number, string>> {
  const rows = await tx
    .select({ number: editions.number, publishedAt: editions.publishedAt })
    .from(editions)
    .where(eq(editions.state, "published"));
  return new Map(rows.map((row) => [row.number, row.publishedAt!.toISOString().slice(0, 10)]));
}

export async function listGroupFigures(tx: Db, editionId: string, material: Material, gas: ProcessGas) {
  const rows = await tx
    .select({ figures: editionGroups.figures })
    .from(editionGroups)
    .where(
      and(
        eq(editionGroups.editionId, editionId),
        eq(editionGroups.material, material),
        eq(editionGroups.processGas, gas),
      ),
    )
    .orderBy(asc(editionGroups.bandIndex), asc(editionGroups.nozzleMm));
  return rows.map((row) => row.figures);
}

export async function listFiguresOf(tx: Db, editionId: string, groupIds: readonly string[]) {
  if (groupIds.length === 0) return [];
  const rows = await tx
    .select({ figures: editionGroups.figures })
    .from(editionGroups)
    .where(and(eq(editionGroups.editionId, editionId), inArray(editionGroups.groupId, [...groupIds])));
  return rows.map((row) => row.figures);
}

export async function listListed(tx: Db, editionId: string, groupId: string) {
  const rows = await tx
    .select({ recipe: listedRecipes.recipe })
    .from(listedRecipes)
    .where(and(eq(listedRecipes.editionId, editionId), eq(listedRecipes.groupId, groupId)));
  return rows.map((row) => row.recipe);
}

/** False when the edition was not waiting to be published any more. */
export async function markPublished(tx: Db, id: string, publishedBy: string | null): Promise<boolean> {
  const rows = await tx
    .update(editions)
    .set({ state: "published", publishedAt: sql`now()`, publishedBy })
    .where(and(eq(editions.id, id), eq(editions.state, "built")))
    .returning({ id: editions.id });
  return rows.length > 0;
}

/** False when the edition was not waiting to be published any more. */
export async function markDiscarded(tx: Db, id: string): Promise<boolean> {
  const rows = await tx
    .update(editions)
    .set({ state: "discarded" })
    .where(and(eq(editions.id, id), eq(editions.state, "built")))
    .returning({ id: editions.id });
  return rows.length > 0;
}

/** Those built before the one that came out. */
export async function discardOlderBuilt(tx: Db, published: Pick<EditionRow, "id" | "number">): Promise<void> {
  await tx
    .update(editions)
    .set({ state: "discarded" })
    .where(and(eq(editions.state, "built"), lt(editions.number, published.number), ne(editions.id, published.id)));
}

/** Two admins who decide at once do it one after the other. */
export async function lockDecisions(tx: Db): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(7311906)`);
}
