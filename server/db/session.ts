import { drizzle } from "drizzle-orm/node-postgres";
import pg from "pg";
import type { Db } from "./client.ts";

/** One connection of one's own, for work that holds a lock, listens, or takes longer than a request may. */
export interface Session {
  db: Db;
  /** False once the connection is gone, whoever ended it. */
  isOpen: () => boolean;
  /** Resolves at the next NOTIFY on the session's channel, when the connection ends, or after so long. */
  waitForNews: (milliseconds: number) => Promise<void>;
  /** Cuts short a statement that is still running. */
  end: () => Promise<void>;
}

/** @param listenTo  a channel to LISTEN on */
export async function openSession(url: string, listenTo?: string): Promise<Session> {
  const client = new pg.Client({
    connectionString: url,
    connectionTimeoutMillis: 3000,
    keepAlive: true,
    idle_in_transaction_session_timeout: 300_000, // a process that hangs in a transaction must not hold its lock for ever
  });
  let open = true;
  let wake = () => {};
  const close = () => {
    open = false;
    wake();
  };
  client.on("error", close); // whatever is being asked fails by itself
  client.on("end", close);
  client.on("notification", () => wake());
  await client.connect();
  if (listenTo) await client.query(`listen ${client.escapeIdentifier(listenTo)}`);
  return {
    db: drizzle(client),
    isOpen: () => open,
    waitForNews: (milliseconds) =>
      new Promise((resolve) => {
        const timer = setTimeout(() => wake(), milliseconds);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
        if (!open) wake();
      }),
    end: () => client.end().catch(() => {}),
  };
}
