import { chmodSync, existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { delay, isRunning, type ProcessMark, thisProcess } from "#server/launch/processes.ts";
import { runStart } from "./start-command.ts";

/** Where the product under test is reached, and where it keeps database, passwords and logs. */
export interface ProductUnderTest {
  address: string;
  folder: string;
}

const prefix = "tempermark-e2e-";

const readMark = (file: string): ProcessMark | undefined => {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return undefined;
  }
};

const startLock = (folder: string) => path.join(folder, "start.lock");

/** A run that was killed leaves its product behind: the next run of the same user ends it and removes its folder. */
async function removeLeftovers(): Promise<void> {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    const folder = path.join(tmpdir(), name);
    const run = readMark(path.join(folder, "run.json"));
    if (!run || isRunning(run)) continue;
    const product = readMark(startLock(folder));
    if (product && isRunning(product)) {
      process.kill(product.pid, "SIGTERM");
      for (let attempt = 0; attempt < 200 && isRunning(product); attempt++) await delay(100);
    }
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Blocks for up to 20 seconds: a process that is leaving has no other way to wait for the product to end. */
function removeAtExit(folder: string): void {
  const sleep = new Int32Array(new SharedArrayBuffer(4));
  for (let attempt = 0; attempt < 200 && existsSync(startLock(folder)); attempt++) Atomics.wait(sleep, 0, 0, 100);
  rmSync(folder, { recursive: true, force: true });
}

/** The real start command on an empty folder: builds the page where it is missing or stale, and fills the database. */
export async function startWholeProduct(): Promise<ProductUnderTest & { stop: () => Promise<void> }> {
  await removeLeftovers();
  const folder = mkdtempSync(path.join(tmpdir(), prefix));
  chmodSync(folder, 0o711); // the database's system user must get through to its own folder below
  writeFileSync(path.join(folder, "run.json"), JSON.stringify(thisProcess()));
  const run = runStart(["--data", folder, "--port", "0"]);
  const leave = () => {
    run.child.kill("SIGTERM");
    removeAtExit(folder);
  };
  process.once("exit", leave);
  const stop = async () => {
    run.child.kill("SIGTERM");
    const code = await run.exit;
    process.removeListener("exit", leave);
    rmSync(folder, { recursive: true, force: true });
    if (code !== 0) throw new Error(`the product ended with ${code}:\n${run.output()}`);
  };
  try {
    return { address: await run.ready, folder, stop };
  } catch (error) {
    await stop().catch(() => {}); // the first reason is the one to tell
    throw error;
  }
}
