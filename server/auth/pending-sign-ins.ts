import { createHash, randomBytes } from "node:crypto";
import type { Request } from "express";

/** One sign-in under way: what must come back from the provider unchanged, and where to go then. */
export interface PendingSignIn {
  state: string;
  nonce: string;
  verifier: string;
  returnTo: string;
  at: number;
}

declare module "express-session" {
  interface SessionData {
    pendingSignIns?: PendingSignIn[];
    idToken?: string;
  }
}

const validForMs = 10 * 60_000;
const keptAtOnce = 5;

const random = () => randomBytes(32).toString("base64url");

/** Begins a sign-in. Several may be under way in one browser: one per tab. */
export function beginSignIn(req: Request, returnTo: string, now: number): PendingSignIn {
  const open = (req.session.pendingSignIns ?? []).filter((pending) => now - pending.at < validForMs);
  const begun = { state: random(), nonce: random(), verifier: random(), returnTo, at: now };
  req.session.pendingSignIns = [...open.slice(1 - keptAtOnce), begun];
  return begun;
}

/** Ends a sign-in: each state is good once, in the browser that began it, for ten minutes. */
export function takePendingSignIn(req: Request, state: string, now: number): PendingSignIn | undefined {
  const open = req.session.pendingSignIns ?? [];
  const found = open.find((pending) => pending.state === state && now - pending.at < validForMs);
  req.session.pendingSignIns = open.filter((pending) => pending !== found);
  return found;
}

/** RFC 7636, method S256. */
export function challengeOf(verifier: string): string {
  return createHash("sha256").update(verifier).digest("base64url");
}

/** Where to go after signing in: a path of this site and nothing else; `//host` and `/\host` would lead away. */
export function safeReturnTo(wanted: unknown): string {
  return typeof wanted === "string" && /^\/(?![/\\])[\x21-\x7e]*$/.test(wanted) ? wanted : "/";
}
