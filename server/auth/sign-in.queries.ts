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

/** Gives a person known by e-mail alone, who has never signed in, to whoever signs in with that address first. */
export async function bindPreparedUser(
  tx: Db,
  { email, ...identity }: { provider: string; subject: string; email: string; name: string },
): Promise<UserRow | undefined> {
  const [row] = await tx
    .update(users)
    .set(identity)
    .where(and(eq(users.email, email), isNull(users.subject)))
    .returning();
  return row;
}

/** Undefined when the identity or the e-mail address is taken. */
export async function insertUser(tx: Db, values: typeof users.$inferInsert): Promise<UserRow | undefined> {
  const [row] = await tx.insert(users).values(values).onConflictDoNothing().returning();
  return row;
}

/**
 * Makes the person a member where they are none yet and an open invitation waits for their e-mail.
 * @returns the shop they have joined by it
 */
export async function acceptInvitation(tx: Db, userId: string, email: string): Promise<string | undefined> {
  const [invitation] = await tx
    .select()
    .from(invitations)
    .where(and(eq(invitations.email, email), isNull(invitations.acceptedAt)))
    .orderBy(invitations.createdAt)
    .limit(1);
  if (!invitation) return undefined;
  const joined = await tx
    .insert(memberships)
    .values({ userId, shopId: invitation.shopId, role: invitation.role })
    .onConflictDoNothing()
    .returning({ userId: memberships.userId });
  if (joined.length === 0) return undefined;
  await tx.update(invitations).set({ acceptedAt: sql`now()` }).where(eq(invitations.id, invitation.id));
  return invitation.shopId;
}
