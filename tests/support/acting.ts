import pg from "pg";
import type { Database } from "#server/db/client.ts";

export type Settings = Partial<Record<"user_id" | "shop_id" | "email" | "identity" | "admin", string>>;
export type Ask = (text: string, values?: unknown[]) => Promise<pg.QueryResult>;

/** One transaction as role `web`, with the settings a request of that actor has; commits. Null: no request at all. */
export async function actingAs<Result>(
  { pool }: Pick<Database, "pool">,
  settings: Settings | null,
  work: (ask: Ask) => Promise<Result>,
): Promise<Result> {
  const client = await pool.connect();
  try {
    await client.query("begin");
    for (const [name, value] of Object.entries(settings ? { acting: "yes", ...settings } : {})) {
      await client.query("select set_config($1, $2, true)", [`app.${name}`, value]);
    }
    const result = await work((text, values = []) => client.query(text, values));
    await client.query("commit");
    return result;
  } catch (error) {
    await client.query("rollback");
    throw error;
  } finally {
    client.release();
  }
}

/** PostgreSQL's code where it refuses, else how many rows the statement touched. */
export async function outcomeOf(statement: Promise<pg.QueryResult>): Promise<string | number> {
  try {
    return (await statement).rowCount ?? 0;
  } catch (error) {
    if (error instanceof pg.DatabaseError && error.code) return error.code;
    throw error;
  }
}

/** No privilege, or a new row that a policy refuses. */
export const notAllowed = "42501";
