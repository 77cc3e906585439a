import { z } from "zod";

export const LogLevel = z.enum(["fatal", "error", "warn", "info", "debug", "silent"]).default("info");

/** Reads a process's settings from its environment and names all that are missing or wrong at once. */
export function parseSettings<Settings>(schema: z.ZodType<Settings>, environment: NodeJS.ProcessEnv): Settings {
  const parsed = schema.safeParse(environment);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`Settings are missing or wrong (see README, Settings):\n${lines.join("\n")}`);
}
