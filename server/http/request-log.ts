import { randomUUID } from "node:crypto";
import type { Request, RequestHandler } from "express";
import type pino from "pino";
import { pinoHttp } from "pino-http";
import { loggedError } from "../logger.ts";

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
      err: loggedError,
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? "error" : "info"),
  });
}
