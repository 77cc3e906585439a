import { createHmac } from "node:crypto";
import type { Request, RequestHandler } from "express";
import { ipKeyGenerator, rateLimit, type Store } from "express-rate-limit";
import type { Db } from "#server/db/client.ts";
import { ProblemError } from "./problem.ts";
import { countHit, forgetCaller, uncountHit } from "./rate-limit.queries.ts";

/** Keeps the counts in PostgreSQL, so that limits hold across every copy of the API. */
function postgresStore(db: Db, name: string, windowMs: number): Store {
  const callerOf = (key: string) => `${name}:${key}`;
  return {
    increment: async (key) => {
      const { hits, resetAt } = await countHit(db, callerOf(key), windowMs);
      return { totalHits: hits, resetTime: resetAt };
    },
    decrement: (key) => uncountHit(db, callerOf(key)),
    resetKey: (key) => forgetCaller(db, callerOf(key)),
  };
}

/** A person by their account, anybody else by a keyed hash of the address: no address is stored. */
function callerKey(req: Request, secret: string): string {
  const user = req.user as { id: string } | undefined;
  if (user) return user.id;
  return createHmac("sha256", secret)
    .update(ipKeyGenerator(req.ip ?? ""))
    .digest("base64url")
    .slice(0, 22);
}

export function limitRate(db: Db, secret: string, name: string, perMinute: number): RequestHandler {
  const windowMs = 60_000;
  return rateLimit({
    windowMs,
    limit: perMinute,
    standardHeaders: "draft-8",
    legacyHeaders: false,
    store: postgresStore(db, name, windowMs),
    keyGenerator: (req) => callerKey(req, secret),
    handler: (_req, _res, next) => next(new ProblemError("too-many-requests")),
  });
}
