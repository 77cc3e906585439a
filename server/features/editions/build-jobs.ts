import type pino from "pino";
import { openSession } from "#server/db/session.ts";
import { buildChannel, hasOpenBuild } from "./edition-builds.queries.ts";
import { type BuilderSettings, runQueuedBuild } from "./run-build.ts";

/** Milliseconds: a notification may be missed while the connection is away, so the queue is looked at anyway. */
const pollEvery = 2000;
const retryAfter = 1000;

export interface BuildJobs {
  signal: AbortSignal;
  logger: pino.Logger;
  /** Called once, when the queue has been reached for the first time. */
  onReady: () => void;
}

/** Builds queued editions until told to stop. A database that goes away is waited for. */
export async function serveBuildJobs(settings: BuilderSettings, jobs: BuildJobs): Promise<void> {
  let ready = false;
  const readyOnce = () => {
    if (!ready) jobs.onReady();
    ready = true;
  };
  while (!jobs.signal.aborted) {
    try {
      await serveWhileConnected(settings, { ...jobs, onReady: readyOnce });
    } catch (error) {
      if (jobs.signal.aborted) return;
      jobs.logger.warn({ err: error }, "the database does not answer: trying again");
      await pause(retryAfter, jobs.signal);
    }
  }
}

async function serveWhileConnected(settings: BuilderSettings, { signal, logger, onReady }: BuildJobs): Promise<void> {
  const queue = await openSession(settings.url, buildChannel);
  const endQueue = () => void queue.end();
  signal.addEventListener("abort", endQueue);
  try {
    onReady();
    while (queue.isOpen() && !signal.aborted) {
      const news = queue.waitForNews(pollEvery); // before looking, so that none is missed in between
      if (await hasOpenBuild(queue.db)) await buildOne(settings, signal, logger);
      await news;
    }
  } finally {
    signal.removeEventListener("abort", endQueue);
    await queue.end();
  }
}

async function buildOne(settings: BuilderSettings, signal: AbortSignal, logger: pino.Logger): Promise<void> {
  const began = Date.now();
  const result = await runQueuedBuild(settings, { signal });
  const seconds = (Date.now() - began) / 1000;
  if (result.outcome === "done") logger.info({ edition: result.number, seconds }, "edition built");
  if (result.outcome === "failed") logger.error({ err: result.error, seconds }, result.message);
}

function pause(milliseconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, milliseconds);
    signal.addEventListener("abort", () => {
      clearTimeout(timer);
      resolve();
    });
  });
}
