import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, expect, test } from "vitest";
import { type Database, openDatabase } from "#server/db/client.ts";
import { createTestDatabase, type TestDatabase } from "../../support/database.ts";
import { builderOf, makeContributors } from "../../support/editions.ts";

let database: TestDatabase;
let owner: Database;
let folder: string;

beforeAll(async () => {
  database = await createTestDatabase();
  owner = openDatabase(database.ownerUrl);
  await makeContributors(owner, 5);
  folder = mkdtempSync(path.join(tmpdir(), "edition-command-"));
  const { url, marksKey } = builderOf(database);
  const left = { EDITION_DATABASE_URL: url, EDITION_MARKS_KEY: marksKey };
  writeFileSync(path.join(folder, "environment.json"), JSON.stringify(left));
});
afterAll(async () => {
  rmSync(folder, { recursive: true, force: true });
  await owner.close();
  await database.drop();
});

async function edition(...args: string[]): Promise<{ code: number; said: string }> {
  const child = spawn(
    process.execPath,
    ["--import", "tsx", "server/features/editions/command.ts", ...args, "--data", folder],
    { env: { PATH: process.env.PATH }, stdio: ["ignore", "pipe", "pipe"] },
  );
  let said = "";
  for (const stream of [child.stdout, child.stderr]) {
    stream.on("data", (chunk) => {
      said += String(chunk);
    });
  }
  const [code] = await once(child, "close");
  return { code: Number(code), said };
}

test("builds, publishes and lists with the settings the start command left", async () => {
  expect(await edition("publish")).toMatchObject({ code: 1, said: expect.stringContaining("No edition waits") });
  expect(await edition("build")).toMatchObject({ code: 0, said: expect.stringContaining("Edition 1 is built.") });
  expect((await edition("build", "--publish")).said).toContain("Edition 2 is published. Groups shown: 1.");
  const { said } = await edition("list");
  expect(said).toMatch(/2 {2}\d{4}-\d\d-\d\d {2}published {2}groups shown: 1\n +1 .*discarded/);
  const { rows } = await owner.pool.query("select actor_id from audit_log where action = 'edition-published'");
  expect(rows).toEqual([{ actor_id: null }]);
}, 60_000);

test("refuses while a build is queued, and explains itself when called wrongly", async () => {
  await owner.pool.query("insert into edition_builds (state) values ('queued')");
  expect(await edition("build")).toMatchObject({ code: 1, said: expect.stringContaining("queued already") });
  expect(await edition("make")).toMatchObject({ code: 1, said: expect.stringContaining("npm run edition -- build") });
}, 60_000);
