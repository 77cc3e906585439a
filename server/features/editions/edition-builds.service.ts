import { type Db, violates } from "#server/db/client.ts";
import { appendAudit } from "#server/features/audit/audit.service.ts";
import type { UserActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { EditionBuild } from "#shared/contracts/editions.ts";
import * as queries from "./edition-builds.queries.ts";

const shownBuilds = 10;

function present({ id, state, groupsDone, groupsTotal, message, ...row }: queries.BuildRow): EditionBuild {
  return {
    ...{ id, state, groupsDone, groupsTotal, message, editionId: row.editionId },
    requestedAt: row.requestedAt.toISOString(),
    finishedAt: row.finishedAt?.toISOString() ?? null,
  };
}

/** Queues a build for the job runner. */
export async function startBuild(tx: Db, actor: UserActor): Promise<EditionBuild> {
  if (await queries.hasOpenBuild(tx)) throw new ProblemError("build-running");
  const build = await refuseSecond(queries.insertBuild(tx, { requestedBy: actor.userId }));
  await queries.announceBuild(tx);
  await appendAudit(tx, actor, "edition-build-requested", build.id);
  return present(build);
}

/** Of two asked for at the same instant, the index lets one through. */
async function refuseSecond<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    throw violates(error, "edition_builds_one_open") ? new ProblemError("build-running") : error;
  }
}

export async function listBuilds(tx: Db): Promise<EditionBuild[]> {
  return (await queries.listBuilds(tx, shownBuilds)).map(present);
}
