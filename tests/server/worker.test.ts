import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { afterAll, afterEach, beforeAll, expect, test } from "vitest";
import { openDatabase } from "#server/db/client.ts";
import { createTestApi, type TestApi } from "../support/api.ts";
import { builderOf, makeContributors } from "../support/editions.ts";
import { makeAdmin } from "../support/factories.ts";

let api: TestApi;
let adminId: string;
let worker: ChildProcess | undefined;

beforeAll(async () => {
  api = await createTestApi();
  adminId = (await makeAdmin(api.owner)).id;
  await makeContributors(api.owner, 5);
});
afterEach(async () => {
  if (worker && worker.exitCode === null) {
    worker.kill("SIGKILL");
    await once(worker, "exit");
  }
  worker = undefined;
});
afterAll(() => api.close());

async function startWorker(environment: Record<string, string> = {}): Promise<ChildProcess> {
  const { url, marksKey } = builderOf(api.database);
  worker = spawn(process.execPath, ["--import", "tsx", "server/worker.ts"], {
    env: { PATH: process.env.PATH, EDITION_DATABASE_URL: url, EDITION_MARKS_KEY: marksKey, ...environment },
    stdio: ["ignore", "pipe", "pipe", "ipc"],
  });
  return worker;
}

async function newestBuild(): Promise<{ state: string; message: string }> {
  return (await (await api.as(adminId)).get("/api/edition-builds").expect(200)).body.items[0];
}

async function waitForState(state: string): Promise<void> {
  await expect.poll(async () => (await newestBuild()).state, { timeout: 15_000, interval: 100 }).toBe(state);
}

const queue = async () => (await api.as(adminId)).post("/api/edition-builds").expect(202);

test("builds what is queued, also after its connections were cut, and ends when told to", async () => {
  const child = await startWorker();
  await once(child, "message");
  await queue();
  await waitForState("done");

  const superuser = openDatabase(api.database.superuserUrl, { max: 1 });
  const cut = await superuser.pool.query(
    "select pg_terminate_backend(pid) from pg_stat_activity where usename = 'edition_builder' and datname = current_database()",
  );
  await superuser.close();
  expect(cut.rowCount).toBeGreaterThan(0);
  await queue();
  await waitForState("done");

  child.kill("SIGTERM");
  expect(await once(child, "exit")).toEqual([0, null]);
}, 60_000);

test("stopped in the middle of a build it fails that build and ends cleanly", async () => {
  // Holds what the build must read, so that it is surely in the middle.
  const blocker = await api.owner.pool.connect();
  await blocker.query("begin; lock table shares in access exclusive mode");
  const child = await startWorker();
  await once(child, "message");
  await queue();
  await waitForState("running");
  child.kill("SIGTERM");
  expect(await once(child, "exit")).toEqual([0, null]);
  await blocker.query("rollback");
  blocker.release();
  expect(await newestBuild()).toMatchObject({ state: "failed", message: expect.stringContaining("stopped") });
}, 60_000);

test("killed outright it leaves a build that the next worker closes", async () => {
  const blocker = await api.owner.pool.connect();
  await blocker.query("begin; lock table shares in access exclusive mode");
  const first = await startWorker();
  await once(first, "message");
  await queue();
  await waitForState("running");
  first.kill("SIGKILL");
  await once(first, "exit");
  await blocker.query("rollback");
  blocker.release();
  await once(await startWorker(), "message");
  await waitForState("failed");
  expect(await newestBuild()).toMatchObject({ message: expect.stringContaining("cut short") });
}, 60_000);

test("refuses settings that are missing, by name", async () => {
  const child = await startWorker({ EDITION_MARKS_KEY: "short" });
  let said = "";
  child.stderr?.on("data", (chunk) => {
    said += String(chunk);
  });
  const [code] = await once(child, "close");
  expect(code).not.toBe(0);
  expect(said).toContain("EDITION_MARKS_KEY: needs 32 characters or more");
}, 60_000);
