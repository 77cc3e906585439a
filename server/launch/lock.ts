import { linkSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { z } from "zod";
import { delay, isRunning, thisProcess } from "./processes.ts";

const LockContent = z.object({ pid: z.number().int(), startedTicks: z.string(), address: z.string().nullable() });
type LockContent = z.infer<typeof LockContent>;

export class AlreadyRunningError extends Error {
  readonly holder: LockContent;

  constructor(holder: LockContent) {
    const place = holder.address ? `at ${holder.address}` : "and is still starting";
    super(`Tempermark is already running in this folder ${place} (process ${holder.pid}).`);
    this.holder = holder;
  }
}

/** One process at a time per lock file. A lock whose process is gone counts for nothing and is taken over. */
export interface Lock {
  /** Tells a second start where the first can be reached. */
  announce: (address: string) => void;
  release: () => void;
}

function read(file: string): string {
  try {
    return readFileSync(file, "utf8");
  } catch {
    return "";
  }
}

function parse(text: string): LockContent | undefined {
  try {
    return LockContent.parse(JSON.parse(text));
  } catch {
    return undefined;
  }
}

/** A link appears whole or not at all, and fails where a file already stands. */
function place(draft: string, file: string): boolean {
  try {
    linkSync(draft, file);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === "EEXIST") return false;
    throw error;
  }
}

/** Moves a dead lock aside. If another start replaced it in between, the living one is put back. */
function removeStale(file: string, seen: string): void {
  const aside = `${file}.stale-${process.pid}`;
  try {
    renameSync(file, aside);
  } catch {
    return; // another start was quicker
  }
  if (read(aside) !== seen) place(aside, file);
  rmSync(aside, { force: true });
}

/** @throws AlreadyRunningError while the process that holds the lock lives */
export function acquireLock(file: string): Lock {
  const draft = `${file}.${process.pid}`;
  const write = (address: string | null) => writeFileSync(draft, JSON.stringify({ ...thisProcess(), address }));
  write(null);
  try {
    while (!place(draft, file)) {
      const seen = read(file);
      const holder = parse(seen);
      if (holder && isRunning(holder)) throw new AlreadyRunningError(holder);
      removeStale(file, seen);
    }
  } finally {
    rmSync(draft, { force: true });
  }
  return {
    announce: (address) => {
      write(address);
      renameSync(draft, file);
    },
    release: () => {
      if (parse(read(file))?.pid === process.pid) rmSync(file, { force: true });
    },
  };
}

async function waitForLock(file: string): Promise<Lock> {
  for (;;) {
    try {
      return acquireLock(file);
    } catch (error) {
      if (!(error instanceof AlreadyRunningError)) throw error;
      await delay(200);
    }
  }
}

/** Waits for its turn, then runs. For short work only, such as building the web application. */
export async function withLock<Result>(file: string, work: () => Promise<Result>): Promise<Result> {
  const lock = await waitForLock(file);
  try {
    return await work();
  } finally {
    lock.release();
  }
}
