import connectPgSimple from "connect-pg-simple";
import type { RequestHandler } from "express";
import session from "express-session";
import type { Database } from "#server/db/client.ts";

const lifetimeMs = 14 * 24 * 3600_000;

/** Sessions in PostgreSQL, good on every copy of the API; they end two weeks after the last use. */
export function sessionHandler(pool: Database["pool"], secret: string, secure: boolean): RequestHandler {
  const Store = connectPgSimple(session);
  return session({
    store: new Store({ pool, tableName: "sessions", createTableIfMissing: false, pruneSessionInterval: 3600 }),
    name: "tempermark.session",
    secret,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: "lax", secure, maxAge: lifetimeMs },
  });
}
