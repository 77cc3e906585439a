import pg from "pg";
import { afterAll, expect, test } from "vitest";
import { withClient } from "#server/db/bootstrap.ts";
import { createTestDatabase } from "#tests/support/database.ts";

const database = await createTestDatabase();
afterAll(() => database.drop());

test.each([["webUrl"], ["builderUrl"], ["ownerUrl"]] as const)("%s has no privilege beyond its own", async (url) => {
  await withClient(database[url], async (client) => {
    const { rows } = await client.query(
      "select rolsuper, rolcreaterole, rolcreatedb, rolbypassrls, rolreplication from pg_roles where rolname = current_user",
    );
    expect(rows).toEqual([
      { rolsuper: false, rolcreaterole: false, rolcreatedb: false, rolbypassrls: false, rolreplication: false },
    ]);
  });
});

test.each([["webUrl"], ["builderUrl"]] as const)("%s cannot make tables", async (url) => {
  const attempt = withClient(database[url], (client) => client.query("create table public.mine (id int)"));
  await expect(attempt).rejects.toThrow("permission denied for schema public");
});

test("a wrong password is refused", async () => {
  const wrong = new URL(database.webUrl);
  wrong.password = "not-the-password";
  await expect(new pg.Client({ connectionString: wrong.href }).connect()).rejects.toThrow(
    "password authentication failed",
  );
});

test("two databases of one template do not see each other", async () => {
  const other = await createTestDatabase();
  await withClient(database.ownerUrl, (client) => client.query("create table only_here (id int)"));
  const look = withClient(other.ownerUrl, (client) => client.query("select from only_here"));
  await expect(look).rejects.toThrow('relation "only_here" does not exist');
  await other.drop();
});
