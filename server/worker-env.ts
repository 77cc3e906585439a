import { z } from "zod";
import { LogLevel, parseSettings } from "./settings.ts";

/** Every setting of the job runner and of the edition command: read once, refused at once when wrong. README lists them. */
export const WorkerSettings = z.object({
  EDITION_DATABASE_URL: z.string().min(1).describe("PostgreSQL as role edition_builder"),
  EDITION_MARKS_KEY: z.string().min(32, "needs 32 characters or more").describe("Never changes once an edition is out"),
  LOG_LEVEL: LogLevel,
});
export type WorkerSettings = z.infer<typeof WorkerSettings>;

export function readWorkerSettings(environment: NodeJS.ProcessEnv): WorkerSettings {
  return parseSettings(WorkerSettings, environment);
}
