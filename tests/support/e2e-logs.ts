import { existsSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";

const files = ["api.log", "worker.log"];

function textOf(file: string): string {
  return existsSync(file) ? readFileSync(file, "utf8") : "";
}

function isError(line: string): boolean {
  if (line.trim() === "") return false;
  try {
    return JSON.parse(line).level >= 50; // pino: 50 is error, 60 fatal
  } catch {
    return true; // nothing but JSON belongs there: a stack trace past the logger, say
  }
}

/** Lines of level error or worse that the servers wrote since the last call, in whichever test file that was. */
export function takeNewErrors(folder: string): string[] {
  const bookmark = path.join(folder, "logs-read.json");
  const read: Record<string, number> = JSON.parse(textOf(bookmark) || "{}");
  const errors = files.flatMap((file) => {
    const text = textOf(path.join(folder, "logs", file));
    const whole = text.slice(read[file] ?? 0, text.lastIndexOf("\n") + 1); // a line being written waits for the next call
    read[file] = (read[file] ?? 0) + whole.length;
    return whole
      .split("\n")
      .filter(isError)
      .map((line) => `${file}: ${line}`);
  });
  writeFileSync(bookmark, JSON.stringify(read));
  return errors;
}
