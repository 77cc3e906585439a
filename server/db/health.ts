import { sql } from "drizzle-orm";
import type { Db } from "./client.ts";

/** Throws when the database does not answer. */
export async function checkDatabase(db: Db): Promise<void> {
  await db.execute(sql`select 1`);
}
