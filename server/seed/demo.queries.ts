import { eq, sql } from "drizzle-orm";
import type { PgTable } from "drizzle-orm/pg-core";
import type { Db } from "#server/db/client.ts";
import { applications } from "#server/db/schema/applications.ts";
import { editions } from "#server/db/schema/editions.ts";
import { machines } from "#server/db/schema/machines.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { shares } from "#server/db/schema/shares.ts";
import { shops } from "#server/db/schema/shops.ts";
import { testCuts } from "#server/db/schema/test-cuts.ts";
import { networkAdmins, users } from "#server/db/schema/users.ts";
import type { DemoShop } from "./demo-network.ts";
import type { RecipeRows } from "./demo-recipes.ts";

/** Rows a statement: PostgreSQL takes 65,535 parameters, the widest table here has 25 columns. */
const rowsAtOnce = 1000;

async function insertAll<Table extends PgTable>(tx: Db, table: Table, rows: Table["$inferInsert"][]): Promise<void> {
  for (let i = 0; i < rows.length; i += rowsAtOnce) {
    // Drizzle does not resolve the insert type of a table it is only told later.
    await tx.insert(table).values(rows.slice(i, i + rowsAtOnce) as never);
  }
}

export async function isEmptyNetwork(db: Db): Promise<boolean> {
  const [found] = (await db.execute(sql`select exists (select from shops) or exists (select from users) as used`)).rows;
  return found?.used === false;
}

export async function insertShops(tx: Db, made: readonly DemoShop[]): Promise<void> {
  await insertAll(
    tx,
    shops,
    made.map(({ shop }) => shop),
  );
  const people = made.flatMap(({ shop, people }) => people.map((person) => ({ ...person, shopId: shop.id })));
  await insertAll(
    tx,
    users,
    people.map(({ user }) => user),
  );
  await insertAll(
    tx,
    memberships,
    people.map(({ user, shopId, role }) => ({ userId: user.id, shopId, role })),
  );
  await insertAll(
    tx,
    machines,
    made.flatMap((shop) => shop.machines),
  );
  await insertBooks(
    tx,
    made.flatMap((shop) => shop.books),
  );
}

export async function insertBooks(tx: Db, books: readonly RecipeRows[]): Promise<void> {
  await insertAll(
    tx,
    recipes,
    books.map(({ recipe }) => recipe),
  );
  await insertAll(
    tx,
    recipeVersions,
    books.flatMap(({ versions }) => versions),
  );
  await insertAll(
    tx,
    testCuts,
    books.flatMap(({ cuts }) => cuts),
  );
  await insertAll(
    tx,
    shares,
    books.flatMap(({ share }) => share ?? []),
  );
}

export async function insertAdmins(tx: Db, admins: (typeof users.$inferInsert & { id: string })[]): Promise<void> {
  await insertAll(tx, users, admins);
  await insertAll(
    tx,
    networkAdmins,
    admins.map(({ id }) => ({ userId: id })),
  );
}

export async function insertApplication(tx: Db, values: typeof applications.$inferInsert): Promise<void> {
  await tx.insert(applications).values(values);
}

export async function suspendShop(tx: Db, name: string, reason: string): Promise<void> {
  await tx.update(shops).set({ state: "suspended", stateReason: reason }).where(eq(shops.name, name));
}

/** Publishes with a date of its own, which the product itself never does. */
export async function publishOn(db: Db, editionId: string, day: Date): Promise<void> {
  await db
    .update(editions)
    .set({ state: "published", builtAt: day, publishedAt: day })
    .where(eq(editions.id, editionId));
}

export async function refreshStatistics(db: Db): Promise<void> {
  await db.execute(sql`analyze`);
}
