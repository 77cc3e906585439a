import { readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { afterAll, expect, test } from "vitest";
import { type Child, startChild } from "#server/launch/children.ts";
import { delay, findProcess } from "#server/launch/processes.ts";
import { listSurvivors, makeDataFolder, removeDataFolder } from "#tests/support/start-command.ts";

const folder = makeDataFolder();
const started: Child[] = [];
afterAll(async () => {
  await Promise.all(started.map((child) => child.stop()));
  removeDataFolder(folder);
});

function runScript(name: string, code: string): Child {
  const file = path.join(folder, `${name}.ts`);
  writeFileSync(file, code);
  const child = startChild({ name, file, env: { ...process.env }, logFolder: folder, patience: 1000 });
  started.push(child);
  return child;
}

async function waitForLine(child: Child): Promise<string> {
  while (child.lastLines() === "") await delay(20);
  return child.lastLines();
}

test("keeps the last lines, and the whole in its log", async () => {
  const child = runScript("talker", "for (let i = 1; i <= 30; i++) console.log('line', i); process.exit(7);");
  expect(await child.ended).toBe(7);
  expect(child.lastLines().split("\n")).toEqual(Array.from({ length: 20 }, (_, i) => `line ${i + 11}`));
  await expect.poll(() => readFileSync(path.join(folder, "talker.log"), "utf8")).toContain("line 1\n");
});

test("stops a child by asking first", async () => {
  const child = runScript(
    "polite",
    'process.on("SIGTERM", () => { console.log("goodbye"); process.exit(0); }); setInterval(() => {}, 1000); console.log("up");',
  );
  await waitForLine(child);
  await child.stop();
  expect(await child.ended).toBe(0);
  expect(child.lastLines()).toContain("goodbye");
});

test("ends a child that does not listen", async () => {
  const child = runScript("deaf", 'process.on("SIGTERM", () => {}); setInterval(() => {}, 1000); console.log("up");');
  await waitForLine(child);
  await child.stop();
  expect(await child.ended).toBe("SIGKILL");
});

test("what a child started does not outlive it", async () => {
  const child = runScript(
    "parent",
    'import { spawn } from "node:child_process"; console.log(spawn("sleep", ["300"], { stdio: "inherit" }).pid); setTimeout(() => process.exit(1), 300);',
  );
  const grandchild = findProcess(Number(await waitForLine(child)));
  expect(grandchild).toBeDefined();
  await child.ended;
  expect(await listSurvivors([grandchild!])).toEqual([]);
});
