import { and, count, eq, type SQL, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { isAfter, orderedBy, placeOf, type SortKey } from "#server/db/keyset.ts";
import { machines } from "#server/db/schema/machines.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { testCuts } from "#server/db/schema/test-cuts.ts";
import { users } from "#server/db/schema/users.ts";
import type { Material } from "#shared/materials/materials.ts";

export type TestCutRow = Awaited<ReturnType<typeof selectTestCuts>>[number];
export type NewTestCut = Omit<typeof testCuts.$inferInsert, "shopId" | "recordedAt">;

export interface TestCutFilter {
  material: Material | undefined;
  acceptable: boolean | undefined;
}

/** Of cuts made in the same minute the one written down last comes first. */
export const newestFirst: readonly SortKey[] = [
  { value: sql`${testCuts.cutAt}`, type: "timestamptz" },
  { value: sql`${testCuts.recordedAt}`, type: "timestamptz" },
  { value: sql`${testCuts.id}`, type: "uuid" },
];

const isOfVersion = and(
  eq(recipeVersions.recipeId, testCuts.recipeId),
  eq(recipeVersions.number, testCuts.versionNumber),
  eq(recipeVersions.shopId, testCuts.shopId),
);

/** Who recorded a cut is named to their own shop only, and no longer once they have left it. */
const isMemberStill = and(eq(memberships.userId, testCuts.recordedBy), eq(memberships.shopId, testCuts.shopId));

function selectTestCuts(tx: Db, shopId: string, filter?: SQL) {
  return tx
    .select({
      cut: testCuts,
      material: recipeVersions.material,
      thicknessMm: recipeVersions.thicknessMm,
      nozzleMm: recipeVersions.nozzleMm,
      machineName: machines.name,
      recordedBy: users.name,
      place: placeOf(newestFirst),
    })
    .from(testCuts)
    .innerJoin(recipeVersions, isOfVersion)
    .innerJoin(machines, eq(machines.id, recipeVersions.machineId))
    .leftJoin(memberships, isMemberStill)
    .leftJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(testCuts.shopId, shopId), filter))
    .orderBy(orderedBy(newestFirst, "desc"))
    .$dynamic();
}

function matches({ material, acceptable }: TestCutFilter): SQL | undefined {
  return and(
    material && eq(recipeVersions.material, material),
    acceptable === undefined ? undefined : eq(testCuts.acceptable, acceptable),
  );
}

export function listTestCuts(
  tx: Db,
  shopId: string,
  filter: TestCutFilter,
  page: { after: readonly string[] | undefined; limit: number },
): Promise<TestCutRow[]> {
  const beyond = page.after && isAfter(newestFirst, page.after, "desc");
  return selectTestCuts(tx, shopId, and(matches(filter), beyond)).limit(page.limit);
}

export async function countTestCuts(tx: Db, shopId: string, filter: TestCutFilter): Promise<number> {
  const [row] = await tx
    .select({ cuts: count() })
    .from(testCuts)
    .innerJoin(recipeVersions, isOfVersion)
    .where(and(eq(testCuts.shopId, shopId), matches(filter)));
  return row!.cuts; // an aggregate without groups gives one row
}

export function listTestCutsOfRecipe(tx: Db, shopId: string, recipeId: string): Promise<TestCutRow[]> {
  return selectTestCuts(tx, shopId, eq(testCuts.recipeId, recipeId));
}

export async function findTestCut(tx: Db, shopId: string, id: string): Promise<TestCutRow | undefined> {
  const [row] = await selectTestCuts(tx, shopId, eq(testCuts.id, id));
  return row;
}

export async function insertTestCut(tx: Db, shopId: string, values: NewTestCut): Promise<string> {
  const [row] = await tx
    .insert(testCuts)
    .values({ ...values, shopId })
    .returning({ id: testCuts.id });
  return row!.id; // INSERT ... RETURNING of one row gives one row
}
