import { createApp } from "./app.ts";
import { openDatabase } from "./db/client.ts";
import { readSettings } from "./env.ts";
import { forgetOldAnswers } from "./http/idempotency.queries.ts";
import { forgetPassedWindows } from "./http/rate-limit.queries.ts";
import { openLogger } from "./logger.ts";
import { onStopSignal } from "./process-end.ts";

const settings = readSettings(process.env);
const logger = openLogger(settings.LOG_LEVEL);
const database = openDatabase(settings.DATABASE_URL, { max: settings.DATABASE_POOL });
const app = createApp(settings, database, logger);

const server = app.listen(settings.PORT, settings.HOST, (error) => {
  if (error) {
    logger.fatal({ err: error }, "cannot listen");
    process.exit(1);
  }
  logger.info({ url: settings.PUBLIC_URL }, "listening");
  process.send?.("ready");
});

const tidyUp = setInterval(() => {
  Promise.all([forgetPassedWindows(database.db), forgetOldAnswers(database.db)]).catch((error: unknown) =>
    logger.warn({ err: error }, "old request counts and answers not tidied"),
  );
}, 3600_000);
tidyUp.unref();

onStopSignal(async () => {
  await new Promise<void>((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 5000).unref();
  });
  await database.close();
});
