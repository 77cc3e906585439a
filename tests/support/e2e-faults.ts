import { readFileSync } from "node:fs";
import path from "node:path";
import pg from "pg";
import { commandLine } from "#server/launch/processes.ts";
import { product } from "./e2e-test.ts";
import { findDescendants } from "./start-command.ts";

const database = "tempermark";

const readJson = (name: string) => JSON.parse(readFileSync(path.join(product.folder, name), "utf8"));

/** As the database's superuser, beside the product. */
async function asSuperuser(...statements: string[]): Promise<void> {
  const url = new URL(readJson("environment.json").OWNER_DATABASE_URL);
  url.username = "postgres";
  url.password = readJson("secrets.json").superuser;
  url.pathname = "/postgres";
  const client = new pg.Client({ connectionString: url.href });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

/** The database lets nobody in, as while it restarts; what was connected is cut off. */
export async function whileDatabaseIsAway(work: () => Promise<void>): Promise<void> {
  await asSuperuser(
    `alter database ${database} allow_connections false`,
    `select pg_terminate_backend(pid) from pg_stat_activity where datname = '${database}'`,
  );
  try {
    await work();
  } finally {
    await asSuperuser(`alter database ${database} allow_connections true`);
  }
}

/** The sign-in provider takes no notice of anybody, as a machine that hangs. */
export async function whileProviderHangs(work: () => Promise<void>): Promise<void> {
  const provider = findDescendants(readJson("start.lock").pid).find(({ pid }) =>
    commandLine(pid).some((word) => word.endsWith("oidc-fake/main.ts")),
  );
  if (!provider) throw new Error("no sign-in provider runs below the start command");
  process.kill(provider.pid, "SIGSTOP");
  try {
    await work();
  } finally {
    process.kill(provider.pid, "SIGCONT");
  }
}
