import { serveBuildJobs } from "./features/editions/build-jobs.ts";
import { openLogger } from "./logger.ts";
import { onStopSignal } from "./process-end.ts";
import { readWorkerSettings } from "./worker-env.ts";

const settings = readWorkerSettings(process.env);
const logger = openLogger(settings.LOG_LEVEL);
const stop = new AbortController();

const ended = serveBuildJobs(
  { url: settings.EDITION_DATABASE_URL, marksKey: settings.EDITION_MARKS_KEY },
  {
    signal: stop.signal,
    logger,
    onReady: () => {
      logger.info("waiting for editions to build");
      process.send?.("ready");
    },
  },
);

onStopSignal(async () => {
  stop.abort();
  await ended;
});

await ended;
