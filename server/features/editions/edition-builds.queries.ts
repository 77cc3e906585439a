import { desc, eq, inArray, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { editionBuilds } from "#server/db/schema/edition-builds.ts";

export type BuildRow = typeof editionBuilds.$inferSelect;

/** The channel on which the job runner hears of a queued build. */
export const buildChannel = "edition_build";

const lockKey = 7_311_905; // any constant: one build at a time in one database

export async function insertBuild(db: Db, values: typeof editionBuilds.$inferInsert): Promise<BuildRow> {
  const [row] = await db.insert(editionBuilds).values(values).returning();
  return row!; // INSERT ... RETURNING of one row gives one row
}

/** Heard when the transaction commits. */
export async function announceBuild(tx: Db): Promise<void> {
  await tx.execute(sql`select pg_notify(${buildChannel}, '')`);
}

export function listBuilds(db: Db, limit: number): Promise<BuildRow[]> {
  return db.select().from(editionBuilds).orderBy(desc(editionBuilds.requestedAt), desc(editionBuilds.id)).limit(limit);
}

export async function hasOpenBuild(db: Db): Promise<boolean> {
  const rows = await db
    .select({ id: editionBuilds.id })
    .from(editionBuilds)
    .where(inArray(editionBuilds.state, ["queued", "running"]))
    .limit(1);
  return rows.length > 0;
}

/** Held until the session ends, however it ends. False when another session holds it. */
export async function takeBuildLock(db: Db): Promise<boolean> {
  const { rows } = await db.execute<{ taken: boolean }>(sql`select pg_try_advisory_lock(${lockKey}) as taken`);
  return rows[0]?.taken === true;
}

/** The queued build, now running; undefined when there is none or another process was quicker. */
export async function claimQueuedBuild(db: Db): Promise<string | undefined> {
  const queued = sql`(select id from edition_builds where state = 'queued' order by requested_at limit 1 for update skip locked)`;
  const [row] = await db
    .update(editionBuilds)
    .set({ state: "running", startedAt: sql`now()` })
    .where(eq(editionBuilds.id, queued))
    .returning({ id: editionBuilds.id });
  return row?.id;
}

export async function updateProgress(db: Db, id: string, groupsDone: number, groupsTotal: number): Promise<void> {
  await db.update(editionBuilds).set({ groupsDone, groupsTotal }).where(eq(editionBuilds.id, id));
}

export async function finishBuild(
  db: Db,
  id: string,
  values: Pick<BuildRow, "message"> & { state: "done" | "failed"; editionId?: string },
): Promise<void> {
  await db
    .update(editionBuilds)
    .set({ ...values, finishedAt: sql`now()` })
    .where(eq(editionBuilds.id, id));
}

/**
 * Closes builds whose process is gone: to be called with the build lock held, when none can be running. One that was cut
 * short between its commit and this row has its edition, which carries its id.
 */
export async function closeOrphanedBuilds(db: Db, message: string): Promise<void> {
  const built = sql`(select e.id from editions e where e.id = edition_builds.id)`;
  await db
    .update(editionBuilds)
    .set({
      state: sql`case when ${built} is null then 'failed' else 'done' end::build_state`,
      message: sql`case when ${built} is null then ${message} else '' end`,
      editionId: built,
      finishedAt: sql`now()`,
    })
    .where(eq(editionBuilds.state, "running"));
}
