import type { ErrorRequestHandler } from "express";
import { isDatabaseUnavailable } from "#server/db/client.ts";
import {
  type FieldProblem,
  type Problem,
  type ProblemType,
  problemTypes,
  problemTypeUri,
} from "#shared/contracts/problem.ts";

interface Extra {
  detail?: string;
  errors?: FieldProblem[];
  current?: unknown;
}

/** A refusal meant for the caller. Everything else that is thrown is our fault and stays in the log. */
export class ProblemError extends Error {
  constructor(
    readonly problem: ProblemType,
    readonly extra: Extra = {},
  ) {
    super(extra.detail ?? problemTypes[problem].title);
    this.name = "ProblemError";
  }
}

/** Express's body parser and router refuse with a status of their own. */
function refusalOf(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (isDatabaseUnavailable(error)) return new ProblemError("database-unavailable");
  const status = (error as { status?: unknown } | null)?.status;
  if (status === 413) return new ProblemError("too-large");
  if (typeof status === "number" && status >= 400 && status < 500) {
    return new ProblemError("invalid-request", { detail: "The request could not be read" });
  }
  return new ProblemError("internal");
}

export function problemBody(error: ProblemError, requestId: string): Problem {
  const { status, title } = problemTypes[error.problem];
  return { type: problemTypeUri(error.problem), title, status, requestId, ...error.extra };
}

/** Last in the chain: alone writes error bodies. Unknown errors are logged whole and sent without their message. */
export const sendProblem: ErrorRequestHandler = (error, req, res, next) => {
  if (res.headersSent) return next(error);
  const refusal = refusalOf(error);
  const { status } = problemTypes[refusal.problem];
  if (status >= 500) req.log.error({ err: error, problem: refusal.problem }, "request failed");
  if (status === 503) res.set("Retry-After", "3");
  // A handler may have named the answer it was about to give: a refusal is neither that version nor that file.
  for (const header of ["ETag", "Content-Disposition"]) res.removeHeader(header);
  res.status(status).type("application/problem+json").set("Cache-Control", "no-store");
  res.send(JSON.stringify(problemBody(refusal, String(req.id))));
};
