import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { bootstrapDatabase, roles } from "#server/db/bootstrap.ts";
import { migrateDatabase } from "#server/db/migrate.ts";
import { type PostgresServer, startPostgres } from "#server/launch/postgres.ts";
import { commandLine, isRunning, thisProcess } from "#server/launch/processes.ts";
import { generateSecrets } from "#server/launch/secrets.ts";

const template = "tempermark_template";
const prefix = "tempermark-test-";

export interface TestPostgres {
  host: string;
  port: number;
  superuserUrl: string;
  /** The migrated, empty database to copy. */
  template: string;
  passwords: { owner: string; web: string; editionBuilder: string };
}

/** A run that was killed leaves its server and folder: the next run of the same user removes them. */
async function removeLeftovers(): Promise<void> {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    const folder = path.join(tmpdir(), name);
    try {
      if (isRunning(JSON.parse(readFileSync(path.join(folder, "run.json"), "utf8")))) continue;
      const data = path.join(folder, "pgdata");
      const pid = Number(readFileSync(path.join(data, "postmaster.pid"), "utf8").split("\n")[0]);
      if (commandLine(pid).includes(data)) process.kill(pid, "SIGQUIT");
    } catch {
      // Not ours to read, or no server left: removing below says the rest.
    }
    try {
      rmSync(folder, { recursive: true, force: true });
    } catch {
      // Another user's run.
    }
  }
}

/** One throwaway server per test run, with the roles of production and one migrated database to copy from. */
export async function startTestPostgres(): Promise<{ urls: TestPostgres; stop: () => Promise<void> }> {
  await removeLeftovers();
  const folder = mkdtempSync(path.join(tmpdir(), prefix));
  chmodSync(folder, 0o711); // the database's system user must get through to its own folder below
  writeFileSync(path.join(folder, "run.json"), JSON.stringify(thisProcess()));
  const remove = () => rmSync(folder, { recursive: true, force: true });
  process.once("exit", remove);
  const secrets = generateSecrets();
  let server: PostgresServer | undefined;
  const stop = async () => {
    await server?.stop();
    remove();
  };
  try {
    server = await startPostgres({
      dataFolder: path.join(folder, "pgdata"),
      superuserPassword: secrets.superuser,
      disposable: true,
    });
    const passwords = { owner: secrets.owner, web: secrets.web, editionBuilder: secrets.editionBuilder };
    await bootstrapDatabase(server.superuserUrl, { database: template, passwords });
    await migrateDatabase(server.urlFor(roles.owner, secrets.owner, template));
    return {
      urls: { host: "127.0.0.1", port: server.port, superuserUrl: server.superuserUrl, template, passwords },
      stop,
    };
  } catch (error) {
    await stop();
    throw error;
  }
}
