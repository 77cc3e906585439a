import { eq, lt, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { rateLimits } from "#server/db/schema/sessions.ts";

/** Counts one request of a caller; a window that has passed begins anew. Atomic, so every copy of the API may call it. */
export async function countHit(db: Db, caller: string, windowMs: number): Promise<{ hits: number; resetAt: Date }> {
  const fresh = sql`now() + ${windowMs} * interval '1 millisecond'`;
  const [row] = await db
    .insert(rateLimits)
    .values({ caller, hits: 1, resetAt: fresh })
    .onConflictDoUpdate({
      target: rateLimits.caller,
      set: {
        hits: sql`case when ${rateLimits.resetAt} <= now() then 1 else ${rateLimits.hits} + 1 end`,
        resetAt: sql`case when ${rateLimits.resetAt} <= now() then ${fresh} else ${rateLimits.resetAt} end`,
      },
    })
    .returning({ hits: rateLimits.hits, resetAt: rateLimits.resetAt });
  return row!; // an upsert of one row gives one row
}

export async function uncountHit(db: Db, caller: string): Promise<void> {
  await db
    .update(rateLimits)
    .set({ hits: sql`greatest(${rateLimits.hits} - 1, 0)` })
    .where(eq(rateLimits.caller, caller));
}

export async function forgetCaller(db: Db, caller: string): Promise<void> {
  await db.delete(rateLimits).where(eq(rateLimits.caller, caller));
}

export async function forgetPassedWindows(db: Db): Promise<void> {
  await db.delete(rateLimits).where(lt(rateLimits.resetAt, sql`now()`));
}
