import { randomUUID } from "node:crypto";
import type { Request, RequestHandler } from "express";
import type pino from "pino";
import { pinoHttp } from "pino-http";

/** One line a request: method, path, status, time, id. No query, header, address or body: they can name people. */
export function requestLog(logger: pino.Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_req, res) => {
      const id = randomUUID();
      res.setHeader("X-Request-Id", id);
      return id;
    },
    wrapSerializers: false, // else errors arrive flattened, without the cause that says what happened
    serializers: {
      req: (req: Request) => ({ id: req.id, method: req.method, path: req.originalUrl?.split("?")[0] }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: (error: Error & { code?: string; cause?: unknown }) => ({
        type: error.name,
        ...(typeof innerOf(error).code === "string" && { code: innerOf(error).code }),
        message: messageWithoutValues(error),
        stack: error.stack
          ?.split("\n")
          .filter((line) => line.trimStart().startsWith("at "))
          .join("\n"),
      }),
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? "error" : "info"),
  });
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
