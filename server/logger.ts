import pino from "pino";

/** The log of one process. Errors go into it without the values they were about. */
export function openLogger(level: string, stream?: pino.DestinationStream): pino.Logger {
  const options = { level, serializers: { err: loggedError } };
  return stream ? pino(options, stream) : pino(options);
}

/** What is written down of an error: Drizzle's own properties hold the statement and its values, so none is taken over. */
export function loggedError(error: Error & { code?: string; cause?: unknown }) {
  return {
    type: error.name,
    ...(typeof innerOf(error).code === "string" && { code: innerOf(error).code }),
    message: messageWithoutValues(error),
    stack: error.stack
      ?.split("\n")
      .filter((line) => line.trimStart().startsWith("at "))
      .join("\n"),
  };
}

function innerOf(error: Error): Error & { code?: unknown } {
  return error.cause instanceof Error ? error.cause : error;
}

/**
 * Drizzle's message quotes the statement and its values; its cause, PostgreSQL's own, does so only for data it cannot
 * read (class 22). A reader that fails quotes what it read.
 */
function messageWithoutValues(error: Error): string {
  const inner = innerOf(error);
  if (typeof inner.code === "string" && /^22...$/.test(inner.code)) return `PostgreSQL refused a value (${inner.code})`;
  if (inner instanceof SyntaxError) return "text that is no JSON";
  return inner.message.split("\n")[0] ?? "";
}
