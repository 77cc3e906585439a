import { and, eq, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { idempotencyKeys } from "#server/db/schema/sessions.ts";

export interface RememberedAnswer {
  requestDigest: string;
  status: number | null;
  response: unknown;
}

/**
 * Claims a key for this transaction. A second request with the same key waits here until the first has ended, then
 * finds its answer. Returns that answer, or undefined when the key is new.
 */
export async function claimKey(
  tx: Db,
  userId: string,
  key: string,
  requestDigest: string,
): Promise<RememberedAnswer | undefined> {
  const claimed = await tx
    .insert(idempotencyKeys)
    .values({ userId, key, requestDigest })
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key });
  if (claimed.length > 0) return undefined;
  const [row] = await tx
    .select()
    .from(idempotencyKeys)
    .where(and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key)));
  return row;
}

export async function rememberAnswer(
  tx: Db,
  userId: string,
  key: string,
  status: number,
  response: unknown,
): Promise<void> {
  await tx
    .update(idempotencyKeys)
    .set({ status, response })
    .where(and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key)));
}

export async function forgetOldAnswers(db: Db): Promise<void> {
  await db.execute(sql`select forget_old_answers()`);
}
