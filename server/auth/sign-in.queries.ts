import { and, eq, isNull, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { invitations } from "#server/db/schema/invitations.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { users } from "#server/db/schema/users.ts";

export type UserRow = typeof users.$inferSelect;

export async function findUserByIdentity(tx: Db, provider: string, subject: string): Promise<UserRow | undefined> {
  const [row] = await tx
    .select()
    .from(users)
    .where(and(eq(users.provider, provider), eq(users.subject, subject)));
  return row;
}

/** A person known by e-mail alone, who has never signed in. */
export async function findUserNeverSignedIn(tx: Db, email: string): Promise<UserRow | undefined> {
  const [row] = await tx
    .select()
    .from(users)
    .where(and(eq(users.email, email), isNull(users.subject)));
  return row;
}

export async function bindIdentity(tx: Db, id: string, provider: string, subject: string, name: string): Promise<void> {
  await tx.update(users).set({ provider, subject, name }).where(eq(users.id, id));
}

export async function insertUser(tx: Db, values: typeof users.$inferInsert): Promise<UserRow> {
  const [row] = await tx.insert(users).values(values).returning();
  return row!; // INSERT ... RETURNING of one row gives one row
}

/** Makes the person a member where they are none yet and an open invitation waits for their e-mail. */
export async function acceptInvitation(tx: Db, userId: string, email: string): Promise<void> {
  const [invitation] = await tx
    .select()
    .from(invitations)
    .where(and(eq(invitations.email, email), isNull(invitations.acceptedAt)))
    .orderBy(invitations.createdAt)
    .limit(1);
  if (!invitation) return;
  const joined = await tx
    .insert(memberships)
    .values({ userId, shopId: invitation.shopId, role: invitation.role })
    .onConflictDoNothing()
    .returning({ userId: memberships.userId });
  if (joined.length === 0) return;
  await tx.update(invitations).set({ acceptedAt: sql`now()` }).where(eq(invitations.id, invitation.id));
}
