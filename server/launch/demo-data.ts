import { withClient } from "../db/bootstrap.ts";

/** Kept with the database itself, so that it cannot be parted from the data it speaks of. */
const unfinished = "demo data unfinished";

/** A seed cut short leaves a half-filled network nobody has worked in: remove it and begin anew. */
export async function dropUnfinishedDemo(superuserUrl: string, database: string): Promise<boolean> {
  return withClient(superuserUrl, async (client) => {
    const found = await client.query(
      "select 1 from pg_database where datname = $1 and shobj_description(oid, 'pg_database') = $2",
      [database, unfinished],
    );
    if (found.rowCount === 0) return false;
    await client.query(`drop database ${client.escapeIdentifier(database)} with (force)`);
    return true;
  });
}

/** The demo network belongs into a database nobody has used: no shop and no person in it. */
export function isEmptyDatabase(superuserDatabaseUrl: string): Promise<boolean> {
  return withClient(superuserDatabaseUrl, async (client) => {
    const found = await client.query("select exists (select from shops) or exists (select from users) as used");
    return found.rows[0]?.used === false;
  });
}

/** Marks the database for as long as the work takes; the mark stays when the work fails. */
export async function whileMarkedUnfinished(
  superuserUrl: string,
  database: string,
  work: () => Promise<void>,
): Promise<void> {
  const mark = (text: string | null) =>
    withClient(superuserUrl, async (client) => {
      const value = text === null ? "null" : client.escapeLiteral(text);
      await client.query(`comment on database ${client.escapeIdentifier(database)} is ${value}`);
    });
  await mark(unfinished);
  await work();
  await mark(null);
}
