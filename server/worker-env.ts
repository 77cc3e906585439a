import { z } from "zod";

/** Every setting of the job runner and of the edition command: read once, refused at once when wrong. README lists them. */
const WorkerSettings = z.object({
  EDITION_DATABASE_URL: z.string().min(1).describe("PostgreSQL as role edition_builder"),
  EDITION_MARKS_KEY: z.string().min(32, "needs 32 characters or more").describe("Never changes once an edition is out"),
  LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "silent"]).default("info"),
});
export type WorkerSettings = z.infer<typeof WorkerSettings>;

export function readWorkerSettings(environment: NodeJS.ProcessEnv): WorkerSettings {
  const parsed = WorkerSettings.safeParse(environment);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`Settings are missing or wrong (see README, Settings):\n${lines.join("\n")}`);
}
