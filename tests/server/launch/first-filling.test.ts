import { afterAll, expect, test, vi } from "vitest";
import { makeDataFolder, removeDataFolder, runStart, type StartRun } from "#tests/support/start-command.ts";

vi.setConfig({ testTimeout: 300_000, hookTimeout: 60_000 });

const folder = makeDataFolder();
const runs: StartRun[] = [];
afterAll(async () => {
  for (const run of runs) run.child.kill("SIGTERM");
  await Promise.all(runs.map((run) => run.exit));
  removeDataFolder(folder);
});

async function startAndStop(): Promise<string> {
  const run = runStart(["--data", folder, "--port", "0"]);
  runs.push(run);
  await run.ready;
  run.child.kill("SIGTERM");
  expect(await run.exit).toBe(0);
  return run.output();
}

test("fills a new database with the demo network, and only a new one", async () => {
  const filling = "filling the empty database with the demo network";
  expect(await startAndStop()).toContain(filling);
  expect(await startAndStop()).not.toContain(filling);
});
