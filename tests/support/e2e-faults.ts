import { readFileSync } from "node:fs";
import path from "node:path";
import pg from "pg";
import { product } from "./e2e-test.ts";
import { findDescendants } from "./start-command.ts";

const readJson = (name: string) => JSON.parse(readFileSync(path.join(product.folder, name), "utf8"));

/** Stops a process in its tracks for a while; it knows nothing of it afterwards. */
async function whileStopped(pid: number, work: () => Promise<void>): Promise<void> {
  process.kill(pid, "SIGSTOP");
  try {
    await work();
  } finally {
    process.kill(pid, "SIGCONT");
  }
}

function partOfProduct(name: string, isIt: (words: string[]) => boolean): number {
  const part = findDescendants(readJson("start.lock").pid).find(({ words }) => isIt(words));
  if (!part) throw new Error(`no ${name} runs below the start command`);
  return part.pid;
}

/** As the database's superuser, beside the product. */
async function connectAsSuperuser(): Promise<pg.Client> {
  const url = new URL(readJson("environment.json").OWNER_DATABASE_URL);
  url.username = "postgres";
  url.password = readJson("secrets.json").superuser;
  url.pathname = "/postgres";
  const client = new pg.Client({ connectionString: url.href });
  await client.connect();
  return client;
}

/** The database lets nobody in any more, and who was connected is cut off. The start command would end with it. */
export async function whileDatabaseIsAway(work: () => Promise<void>): Promise<void> {
  const server = partOfProduct("PostgreSQL", ([program = ""]) => program.endsWith("/postgres"));
  const superuser = await connectAsSuperuser();
  await whileStopped(server, async () => {
    await superuser.query("select pg_terminate_backend(pid) from pg_stat_activity where datname = 'tempermark'");
    await superuser.end();
    await work();
  });
}

/** The sign-in provider takes questions and answers none. */
export function whileProviderHangs(work: () => Promise<void>): Promise<void> {
  return whileStopped(
    partOfProduct("sign-in provider", (words) => words.some((word) => word.endsWith("oidc-fake/main.ts"))),
    work,
  );
}
