import { randomBytes } from "node:crypto";
import { inject } from "vitest";
import { createOwnedDatabase, roles, withClient } from "#server/db/bootstrap.ts";
import { openDatabase } from "#server/db/client.ts";

/** One database of a test file's own, migrated and empty. */
export interface TestDatabase {
  name: string;
  ownerUrl: string;
  webUrl: string;
  builderUrl: string;
  superuserUrl: string;
  /** Ends connections that are still open. */
  drop: () => Promise<void>;
}

/** Copies the migrated template: about 20 ms. Call `drop` when the file is done. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const postgres = inject("postgres");
  if (!postgres) throw new Error("this project of tests runs without PostgreSQL: see tests/support/global-setup.ts");
  const name = `test_${randomBytes(6).toString("hex")}`;
  await withClient(postgres.superuserUrl, (client) => createOwnedDatabase(client, name, postgres.template));

  const urlFor = (role: string, password: string) =>
    `postgres://${role}:${encodeURIComponent(password)}@${postgres.host}:${postgres.port}/${name}`;
  const superuserUrl = new URL(postgres.superuserUrl);
  superuserUrl.pathname = `/${name}`;
  return {
    name,
    ownerUrl: urlFor(roles.owner, postgres.passwords.owner),
    webUrl: urlFor(roles.web, postgres.passwords.web),
    builderUrl: urlFor(roles.editionBuilder, postgres.passwords.editionBuilder),
    superuserUrl: superuserUrl.href,
    drop: async () => {
      await withClient(postgres.superuserUrl, (client) => client.query(`drop database if exists ${name} with (force)`));
    },
  };
}

/** The same, open as each of its roles. Call `close` when the file is done: it drops the database too. */
export async function openTestDatabase() {
  const database = await createTestDatabase();
  const owner = openDatabase(database.ownerUrl);
  const web = openDatabase(database.webUrl);
  const builder = openDatabase(database.builderUrl);
  const close = async () => {
    await Promise.all([owner.close(), web.close(), builder.close()]);
    await database.drop();
  };
  return { ...database, owner, web, builder, close };
}
