import { type ChildProcess, spawn } from "node:child_process";
import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { commandLine, delay, findProcess, isRunning, type ProcessMark } from "#server/launch/processes.ts";

/** A folder for one installation, open to the database's system user. */
export function makeDataFolder(): string {
  const folder = mkdtempSync(path.join(tmpdir(), "tempermark-start-"));
  chmodSync(folder, 0o711);
  return folder;
}

export const removeDataFolder = (folder: string): void => rmSync(folder, { recursive: true, force: true });

/** One run of the start command, as a person at a terminal has it. */
export interface StartRun {
  child: ChildProcess;
  output: () => string;
  /** Resolves with the address once the welcome is printed; rejects when the command ends before. */
  ready: Promise<string>;
  exit: Promise<number | null>;
}

export function runStart(args: readonly string[], env: NodeJS.ProcessEnv = {}): StartRun {
  const child = spawn(process.execPath, ["--import", "tsx", "server/launch/start.ts", ...args], {
    env: { ...process.env, NODE_ENV: "development", ...env },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let output = "";
  const exit = new Promise<number | null>((resolve) => child.once("close", resolve));
  const ready = new Promise<string>((resolve, reject) => {
    const take = (chunk: Buffer) => {
      output += chunk;
      const address = /Tempermark runs at {2}(\S+)/.exec(output)?.[1];
      if (address && /Ctrl-C stops it/.test(output)) resolve(address);
    };
    child.stdout.on("data", take);
    child.stderr.on("data", take);
    void exit.then((code) => reject(new Error(`the start command ended with ${code}:\n${output}`)));
  });
  ready.catch(() => {}); // a run that is meant to fail is judged by its exit code
  return { child, output: () => output, ready, exit };
}

function parentOf(pid: number): number | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    return Number(stat.slice(stat.lastIndexOf(")") + 2).split(" ")[1]);
  } catch {
    return undefined;
  }
}

/** Every process below one, with its command line. */
export function findDescendants(ancestor: number): (ProcessMark & { words: string[] })[] {
  const pids = readdirSync("/proc").map(Number).filter(Number.isInteger);
  const parents = new Map(pids.map((pid) => [pid, parentOf(pid)]));
  const isBelow = (pid: number | undefined): boolean =>
    pid !== undefined && (parents.get(pid) === ancestor || isBelow(parents.get(pid) || undefined));
  return pids
    .filter((pid) => isBelow(pid))
    .flatMap((pid) => {
      const mark = findProcess(pid);
      return mark ? [{ ...mark, words: commandLine(pid) }] : [];
    });
}

/** Waits up to ten seconds for all to end and returns what still runs. */
export async function listSurvivors<Mark extends ProcessMark>(marks: readonly Mark[]): Promise<Mark[]> {
  for (let attempt = 0; attempt < 100 && marks.some(isRunning); attempt++) await delay(100);
  return marks.filter(isRunning);
}
