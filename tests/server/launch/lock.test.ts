import { readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { afterAll, beforeEach, expect, test } from "vitest";
import { AlreadyRunningError, acquireLock, withLock } from "#server/launch/lock.ts";
import { delay, thisProcess } from "#server/launch/processes.ts";
import { makeDataFolder, removeDataFolder } from "#tests/support/start-command.ts";

const folder = makeDataFolder();
let file = "";
let count = 0;
beforeEach(() => {
  file = path.join(folder, `${count++}.lock`);
});
afterAll(() => removeDataFolder(folder));

test("refuses a second holder and says where the first is", () => {
  const lock = acquireLock(file);
  expect(() => acquireLock(file)).toThrow("still starting");
  lock.announce("http://127.0.0.1:4300");
  expect(() => acquireLock(file)).toThrow(`at http://127.0.0.1:4300 (process ${process.pid})`);
  lock.release();
  acquireLock(file).release();
});

test.each([
  ["a process that is gone", JSON.stringify({ pid: 2 ** 22 + 1, startedTicks: "1", address: null })],
  [
    "another process that was given the same number",
    JSON.stringify({ ...thisProcess(), startedTicks: "1", address: null }),
  ],
  ["a file cut short", '{"pid": 12'],
  ["an empty file", ""],
])("takes over from %s, and leaves no other file", (_what, content) => {
  writeFileSync(file, content);
  const lock = acquireLock(file);
  expect(JSON.parse(readFileSync(file, "utf8")).pid).toBe(process.pid);
  lock.release();
  expect(readdirSync(folder).filter((name) => name.startsWith(path.basename(file)))).toEqual([]);
});

test("does not remove a lock that another process has taken since", () => {
  const lock = acquireLock(file);
  writeFileSync(file, JSON.stringify({ pid: 1, startedTicks: "0", address: null }));
  lock.release();
  expect(JSON.parse(readFileSync(file, "utf8")).pid).toBe(1);
});

test("work under one lock never overlaps, and a failure releases it", async () => {
  let inside = 0;
  let most = 0;
  const work = async () => {
    most = Math.max(most, ++inside);
    await delay(20);
    inside--;
  };
  await Promise.all([withLock(file, work), withLock(file, work), withLock(file, work)]);
  expect(most).toBe(1);
  const failing = withLock(file, () => Promise.reject(new AlreadyRunningError({ ...thisProcess(), address: "inner" })));
  await expect(Promise.race([failing, delay(500).then(() => "waits for ever")])).rejects.toThrow("inner");
});
