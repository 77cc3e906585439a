import type { RequestHandler } from "express";
import { ProblemError } from "./problem.ts";

const safe = new Set(["GET", "HEAD", "OPTIONS"]);

/** Refuses writes that a page of another site could have sent: browsers name the page's origin on each of them. */
export function requireOwnOrigin(publicOrigin: string): RequestHandler {
  return (req, _res, next) => {
    if (safe.has(req.method) || req.get("Origin") === publicOrigin) return next();
    next(new ProblemError("origin-refused"));
  };
}
