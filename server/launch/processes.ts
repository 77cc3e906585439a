import { readFileSync } from "node:fs";

/** One run of a process. A number alone is not enough: the kernel gives it to another process after a restart. */
export interface ProcessMark {
  pid: number;
  /** Clock ticks between the boot of the machine and the start of the process. */
  startedTicks: string;
}

/** Undefined for a process that is gone, or that has ended and only waits to be collected by its parent. */
export function findProcess(pid: number): ProcessMark | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    // The second field is the command in brackets and may hold spaces: count from behind it.
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    const [state, startedTicks] = [fields[0], fields[19]];
    return state === "Z" || state === "X" || startedTicks === undefined ? undefined : { pid, startedTicks };
  } catch {
    return undefined;
  }
}

export function isRunning(mark: ProcessMark): boolean {
  return findProcess(mark.pid)?.startedTicks === mark.startedTicks;
}

export function thisProcess(): ProcessMark {
  return findProcess(process.pid) ?? { pid: process.pid, startedTicks: "unknown" };
}

/** The command line of a process, one word per entry; empty when it is gone. */
export function commandLine(pid: number): string[] {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, "utf8").split("\0").filter(Boolean);
  } catch {
    return [];
  }
}

export const isRoot = (): boolean => process.getuid?.() === 0;

export const delay = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));
