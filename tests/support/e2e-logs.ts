import { existsSync, readFileSync } from "node:fs";
import path from "node:path";

const files = ["api.log", "worker.log"];

export type LogPlace = Record<string, number>;

const read = (folder: string, file: string): string => {
  const full = path.join(folder, "logs", file);
  return existsSync(full) ? readFileSync(full, "utf8") : "";
};

/** Where the logs end now. */
export const logPlace = (folder: string): LogPlace =>
  Object.fromEntries(files.map((file) => [file, read(folder, file).length]));

function isError(line: string): boolean {
  if (line.trim() === "") return false;
  try {
    return JSON.parse(line).level >= 50; // pino: 50 is error, 60 fatal
  } catch {
    return true; // nothing but JSON belongs there: a stack trace past the logger, say
  }
}

/** Lines of level error or worse that the servers wrote since. */
export function errorsSince(folder: string, place: LogPlace): string[] {
  return files.flatMap((file) =>
    read(folder, file)
      .slice(place[file])
      .split("\n")
      .filter(isError)
      .map((line) => `${file}: ${line}`),
  );
}
