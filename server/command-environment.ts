import { existsSync, readFileSync } from "node:fs";
import path from "node:path";

/** Where the start command leaves the settings of commands given beside it. */
export const commandEnvironmentFile = (dataFolder: string): string => path.join(dataFolder, "environment.json");

/**
 * The environment decides; where it does not name the database, what the start command has left fills it in.
 * @param databaseSetting  the setting that names the database of this command
 */
export function readCommandEnvironment(dataFolder: string, databaseSetting: string): NodeJS.ProcessEnv {
  const file = commandEnvironmentFile(dataFolder);
  if (process.env[databaseSetting] || !existsSync(file)) return process.env;
  return { ...JSON.parse(readFileSync(file, "utf8")), ...process.env };
}
