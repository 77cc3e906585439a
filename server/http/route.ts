import { createHash } from "node:crypto";
import type { Request, RequestHandler, Response, Router } from "express";
import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import type { Access, Endpoint } from "#shared/contracts/endpoint.ts";
import { becomeActor } from "./actor.queries.ts";
import { type Actor, type ActorFor, requireAccess } from "./actor.ts";
import { claimKey, rememberAnswer } from "./idempotency.queries.ts";
import { ProblemError } from "./problem.ts";
import { parsePart } from "./validation.ts";

/** Says that the caller's copy is still good: answered with 304. */
export const notModified = Symbol("not modified");

export interface RouteContext<P, Q, B, Who extends Access> {
  /** The request's one transaction, under row-level security as the actor. Committed before the answer is sent. */
  tx: Db;
  actor: ActorFor<Who>;
  params: P;
  query: Q;
  body: B;
  req: Request;
  /** Sets the ETag; true when the caller already holds it, and the handler may answer `notModified`. */
  hasCurrent: (etag: string) => boolean;
  /** Name of the file a browser saves the answer under. */
  saveAs: (filename: string) => void;
}

interface Answer {
  status: number;
  body: unknown;
}

/** Binds a contract to its handler: signs in, checks the role, parses both ways, holds the transaction, sets the status. */
export function route<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  R extends z.ZodType,
  Who extends Access,
>(
  router: Router,
  db: Db,
  endpoint: Endpoint<P, Q, B, R, Who>,
  handler: (
    context: RouteContext<z.output<P>, z.output<Q>, z.output<B>, Who>,
  ) => Promise<z.input<R> | typeof notModified>,
): void {
  const handle: RequestHandler = async (req, res) => {
    const answer = await db.transaction(async (tx): Promise<Answer> => {
      const actor = await becomeActor(tx, signedInUser(req));
      requireAccess(actor, endpoint.access);
      const context = {
        ...parseRequest(endpoint, req, actor),
        tx,
        actor: actor as ActorFor<Who>,
        req,
        ...replyTools(req, res),
      };
      return once(tx, actor, endpoint, req, context.body, async () => {
        const result = await handler(context);
        if (result === notModified) return { status: 304, body: undefined };
        return { status: endpoint.status, body: endpoint.response.parse(result) };
      });
    });
    send(res, endpoint, answer);
  };
  router[endpoint.method](endpoint.path, handle);
}

function signedInUser(req: Request): string | null {
  return (req.user as { id: string } | undefined)?.id ?? null;
}

function parseRequest<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType>(
  endpoint: Endpoint<P, Q, B>,
  req: Request,
  actor: Actor,
) {
  const params = endpoint.params.safeParse(req.params);
  if (!params.success) throw new ProblemError("not-found");
  // express.json leaves any other body unread, which would pass for an empty one. A browser's POST without a body says so by its length.
  if (req.get("Content-Length") !== "0" && req.is("application/json") === false) {
    throw new ProblemError("invalid-request", { detail: "Send the body as application/json" });
  }
  return {
    params: params.data,
    query: parsePart(endpoint.query, "query", req.query, actor.units),
    body: parsePart(endpoint.body, "body", req.body ?? {}, actor.units),
  };
}

function replyTools(req: Request, res: Response) {
  return {
    hasCurrent: (etag: string) => {
      // no-cache, not immutable: a suspended member must be asked again, and a 304 costs next to nothing.
      res.set({ ETag: `"${etag}"`, "Cache-Control": "private, no-cache" });
      return req.fresh;
    },
    saveAs: (filename: string) => {
      res.set("Content-Disposition", `attachment; filename="${filename}"`);
    },
  };
}

/**
 * A POST sent again with the same Idempotency-Key gets the first answer and does nothing twice. What anybody may call does
 * no harm sent twice, and is not kept: the answer to a sign-out holds the ID token.
 */
async function once(
  tx: Db,
  actor: Actor,
  endpoint: Endpoint,
  req: Request,
  body: unknown,
  work: () => Promise<Answer>,
): Promise<Answer> {
  const key = req.get("Idempotency-Key");
  const mayRepeat = endpoint.method !== "post" || endpoint.access === "anyone";
  if (mayRepeat || key === undefined || actor.userId === null) return work();
  if (!/^[\w-]{8,64}$/.test(key)) {
    throw new ProblemError("invalid-request", { detail: "Idempotency-Key needs 8 to 64 letters, digits, - or _" });
  }
  const digest = createHash("sha256")
    .update(`${req.originalUrl}\n${JSON.stringify(body)}`)
    .digest("hex");
  const known = await claimKey(tx, actor.userId, key, digest);
  if (known) {
    if (known.requestDigest !== digest || known.status === null) throw new ProblemError("key-reused");
    return { status: known.status, body: known.response };
  }
  const answer = await work();
  await rememberAnswer(tx, actor.userId, key, answer.status, answer.body ?? null);
  return answer;
}

function send(res: Response, endpoint: Endpoint, answer: Answer): void {
  if (!res.get("Cache-Control")) res.set("Cache-Control", "no-store");
  res.status(answer.status);
  if (answer.status === 304 || answer.status === 204) res.end();
  else if (endpoint.mediaType === "text/csv") res.type("text/csv").send(answer.body);
  else res.json(answer.body);
}
