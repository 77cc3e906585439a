import { Writable } from "node:stream";
import pino from "pino";

/** A logger whose lines a test can read. */
export function captureLog(): { logger: pino.Logger; text: () => string; entries: () => Record<string, unknown>[] } {
  let written = "";
  const stream = new Writable({
    write: (chunk, _encoding, done) => {
      written += chunk;
      done();
    },
  });
  return {
    logger: pino({ level: "debug" }, stream),
    text: () => written,
    entries: () =>
      written
        .split("\n")
        .filter(Boolean)
        .map((line) => JSON.parse(line)),
  };
}
