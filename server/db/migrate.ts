import { fileURLToPath } from "node:url";
import { drizzle } from "drizzle-orm/node-postgres";
import { migrate } from "drizzle-orm/node-postgres/migrator";
import pg from "pg";

const lockKey = 7_311_904; // any constant: one migration at a time in one database

/** Brings a database to the newest schema, as its owner. Two processes may call it at once: the second waits. */
export async function migrateDatabase(ownerUrl: string, folder = "drizzle"): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock($1)", [lockKey]);
    await migrate(drizzle(client), { migrationsFolder: folder });
  } finally {
    await client.end();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const url = process.env.OWNER_DATABASE_URL;
  if (!url) throw new Error("Set OWNER_DATABASE_URL to the database as its owning role");
  await migrateDatabase(url);
  console.log("The database has the newest schema.");
}
