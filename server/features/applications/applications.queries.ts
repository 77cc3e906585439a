import { desc, eq, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { applications } from "#server/db/schema/applications.ts";
import { invitations } from "#server/db/schema/invitations.ts";
import { shops } from "#server/db/schema/shops.ts";

export type ApplicationRow = typeof applications.$inferSelect;

/**
 * Does nothing while an application of that address waits. Asks for no row back and names no column to conflict on:
 * either would need the right to read applications, which whoever applies does not have.
 */
export async function insertApplication(tx: Db, values: typeof applications.$inferInsert): Promise<void> {
  await tx.insert(applications).values(values).onConflictDoNothing();
}

/** The one last sent from an address. */
export async function findNewestApplication(tx: Db, email: string): Promise<ApplicationRow | undefined> {
  const [row] = await tx
    .select()
    .from(applications)
    .where(eq(applications.email, email))
    .orderBy(desc(applications.createdAt))
    .limit(1);
  return row;
}

/** Waiting ones first, the longest waiting at the top; then the decided ones, the latest decision first. */
export function listApplications(tx: Db, limit: number): Promise<ApplicationRow[]> {
  const { state, createdAt, decidedAt, id } = applications;
  return tx
    .select()
    .from(applications)
    .orderBy(sql`${state} <> 'waiting'`, sql`case when ${state} = 'waiting' then ${createdAt} end`, desc(decidedAt), id)
    .limit(limit);
}

/** Holds the row until the transaction ends, so that two admins decide one after the other. */
export async function findApplicationLocked(tx: Db, id: string): Promise<ApplicationRow | undefined> {
  const [row] = await tx.select().from(applications).where(eq(applications.id, id)).for("update");
  return row;
}

export async function decideApplication(
  tx: Db,
  id: string,
  values: Pick<ApplicationRow, "state" | "decidedBy"> & Partial<Pick<ApplicationRow, "reason" | "shopId">>,
): Promise<ApplicationRow> {
  const [row] = await tx
    .update(applications)
    .set({ ...values, decidedAt: sql`now()` })
    .where(eq(applications.id, id))
    .returning();
  return row!; // the row is locked by this transaction
}

/** What an admin may know of an address: whether it belongs to a member, is invited already, or is free. */
export async function findEmailStanding(tx: Db, email: string): Promise<"member" | "invited" | "free" | null> {
  const { rows } = await tx.execute<{ standing: "member" | "invited" | "free" | null }>(
    sql`select email_standing(${email}) as standing`,
  );
  return rows[0]?.standing ?? null;
}

export async function insertShop(tx: Db, values: { id: string; name: string; place: string }): Promise<void> {
  await tx.insert(shops).values(values);
}

export async function insertInvitation(tx: Db, values: typeof invitations.$inferInsert): Promise<void> {
  await tx.insert(invitations).values(values);
}
