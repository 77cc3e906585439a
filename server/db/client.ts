import { drizzle, type NodePgQueryResultHKT } from "drizzle-orm/node-postgres";
import type { PgDatabase } from "drizzle-orm/pg-core";
import pg from "pg";

/** A connection or a transaction: queries take either. */
export type Db = PgDatabase<NodePgQueryResultHKT>;

export interface Database {
  db: Db;
  pool: pg.Pool;
  close: () => Promise<void>;
}

/**
 * A pool of connections as one database role.
 * Statements end by themselves after 15 s so that one slow question cannot hold the pool; the edition builder asks for more.
 */
export function openDatabase(url: string, options: { max?: number; statementTimeoutMs?: number } = {}): Database {
  const pool = new pg.Pool({
    connectionString: url,
    max: options.max ?? 10,
    connectionTimeoutMillis: 3000,
    idleTimeoutMillis: 30_000,
    statement_timeout: options.statementTimeoutMs ?? 15_000,
    idle_in_transaction_session_timeout: 60_000,
  });
  // A server that goes away ends idle connections too; the next request opens new ones.
  pool.on("error", () => {});
  // The same for one that is lent out and idle between two statements: the next statement on it fails and says so.
  pool.on("connect", (client) => client.on("error", () => {}));
  return { db: withOwnTransactions(pool), pool, close: () => pool.end() };
}

/** Drizzle's own transaction never gives a connection back on which `begin` failed: ten of them would empty the pool. */
function withOwnTransactions(pool: pg.Pool): Db {
  const transaction: Db["transaction"] = async (work, config) => {
    const client = await pool.connect();
    try {
      return await drizzle(client).transaction(work, config);
    } finally {
      client.release();
    }
  };
  return Object.assign(drizzle(pool), { transaction });
}

const unavailable = new Set([
  "ECONNREFUSED",
  "ECONNRESET",
  "EPIPE",
  "ETIMEDOUT",
  "EHOSTUNREACH",
  "ENETUNREACH",
  "ENOTFOUND",
  "EAI_AGAIN",
  "57P01",
  "57P02",
  "57P03",
  "53300",
  "08000",
  "08001",
  "08003",
  "08006",
]);

/** The error beneath Drizzle's wrapping, with PostgreSQL's code and the constraint it names. */
export function databaseError(error: unknown): { code?: string; constraint?: string; message: string } | undefined {
  for (let inner: unknown = error; inner instanceof Error; inner = inner.cause) {
    const { code, constraint } = inner as Error & { code?: unknown; constraint?: unknown };
    if (typeof code === "string") {
      return { code, message: inner.message, ...(typeof constraint === "string" && { constraint }) };
    }
    if (/Connection terminated|timeout exceeded when trying to connect|is not queryable/.test(inner.message)) {
      return { code: "08006", message: inner.message };
    }
  }
  return undefined;
}

export function isDatabaseUnavailable(error: unknown): boolean {
  return unavailable.has(databaseError(error)?.code ?? "");
}

export function violates(error: unknown, constraint: string): boolean {
  return databaseError(error)?.constraint === constraint;
}
