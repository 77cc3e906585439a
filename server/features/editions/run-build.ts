import { isDatabaseUnavailable } from "#server/db/client.ts";
import { openSession, type Session } from "#server/db/session.ts";
import { type DisclosureParameters, defaultDisclosureParameters } from "#shared/disclosure/parameters.ts";
import { buildEdition, OtherMarksKeyError } from "./build-edition.ts";
import * as builds from "./edition-builds.queries.ts";

export interface BuilderSettings {
  /** PostgreSQL as role edition_builder. */
  url: string;
  /** Keys the digests of what was contributed. The same for the life of a network. */
  marksKey: string;
  parameters?: DisclosureParameters;
}

export interface BuildWatch {
  /** Ends a build half-way; nothing of it is kept. */
  signal?: AbortSignal;
  onProgress?: (groupsDone: number, groupsTotal: number) => Promise<void> | void;
}

export type BuildResult =
  | { outcome: "idle" | "busy" }
  | { outcome: "done"; editionId: string; number: number }
  | { outcome: "failed"; message: string; error: unknown };

/** Milliseconds between two updates of the progress that others see. */
const progressEvery = 400;
const cutShort = "The build was cut short: its process or its connection ended. The last edition stands.";
const stopped = "The build was stopped together with the job runner. The last edition stands.";

/** Builds the queued edition, if there is one. */
export function runQueuedBuild(settings: BuilderSettings, watch: BuildWatch = {}): Promise<BuildResult> {
  return run(settings, watch, ({ db }) => builds.claimQueuedBuild(db));
}

/** Builds at once, by nobody's request. @throws when one is queued already (constraint edition_builds_one_open) */
export function runDirectBuild(settings: BuilderSettings, watch: BuildWatch = {}): Promise<BuildResult> {
  return run(
    settings,
    watch,
    async ({ db }) => (await builds.insertBuild(db, { state: "running", startedAt: new Date() })).id,
  );
}

/**
 * One connection holds the lock and the transaction; a second one writes the job's row, so that progress shows while the
 * transaction is open and a failure can be written when the first connection is lost.
 */
async function run(
  settings: BuilderSettings,
  watch: BuildWatch,
  claim: (desk: Session) => Promise<string | undefined>,
): Promise<BuildResult> {
  const work = await openSession(settings.url);
  let desk: Session | undefined;
  const endWork = () => void work.end();
  try {
    desk = await openSession(settings.url);
    if (!(await builds.takeBuildLock(work.db))) return { outcome: "busy" };
    await builds.closeOrphanedBuilds(desk.db, cutShort);
    const id = await claim(desk);
    if (id === undefined) return { outcome: "idle" };
    watch.signal?.addEventListener("abort", endWork);
    if (watch.signal?.aborted) endWork();
    return await buildAndReport(id, work, desk, settings, watch);
  } finally {
    watch.signal?.removeEventListener("abort", endWork);
    await Promise.all([work.end(), desk?.end()]);
  }
}

async function buildAndReport(
  id: string,
  work: Session,
  desk: Session,
  settings: BuilderSettings,
  watch: BuildWatch,
): Promise<BuildResult> {
  const options = {
    id,
    today: new Date().toISOString().slice(0, 10),
    marksKey: settings.marksKey,
    parameters: settings.parameters ?? defaultDisclosureParameters,
    onProgress: showProgress(id, desk, watch),
  };
  try {
    const { number } = await work.db.transaction((tx) => buildEdition(tx, options), {
      isolationLevel: "repeatable read",
    });
    await builds.finishBuild(desk.db, id, { state: "done", message: "", editionId: id });
    return { outcome: "done", editionId: id, number };
  } catch (error) {
    const message = watch.signal?.aborted ? stopped : work.isOpen() ? wordsFor(error) : cutShort;
    await builds.finishBuild(desk.db, id, { state: "failed", message });
    return { outcome: "failed", message, error };
  }
}

function showProgress(id: string, desk: Session, { onProgress }: BuildWatch) {
  let shownAt = 0;
  return async (done: number, total: number): Promise<void> => {
    if (Date.now() - shownAt >= progressEvery || done === total) {
      shownAt = Date.now();
      await builds.updateProgress(desk.db, id, done, total);
    }
    await onProgress?.(done, total);
  };
}

function wordsFor(error: unknown): string {
  if (isDatabaseUnavailable(error)) return cutShort;
  if (error instanceof OtherMarksKeyError) {
    return "EDITION_MARKS_KEY is not the key the last edition was built with. Put the old key back; nothing was built.";
  }
  return "Something failed while building: the job runner's log says what. The last edition stands.";
}
