import { type ChildProcess, spawn } from "node:child_process";
import { createWriteStream, mkdirSync } from "node:fs";
import path from "node:path";

export interface ChildOptions {
  name: string;
  /** A script of ours or of a package; TypeScript is fine. */
  file: string;
  args?: readonly string[];
  env: NodeJS.ProcessEnv;
  logFolder: string;
  /** Also show what it says, line by line. */
  show?: (line: string) => void;
  /** Milliseconds it gets to finish what it is doing when stopped. */
  patience?: number;
}

export interface Child {
  name: string;
  /** Resolves with the exit code, or the name of the signal, when it has ended for whatever reason. */
  ended: Promise<number | string>;
  hasEnded: () => boolean;
  /** What it said last, for an explanation of a crash. */
  lastLines: () => string;
  stop: () => Promise<void>;
}

const keptLines = 20;
const stopWithParent = new URL("./stop-with-parent.ts", import.meta.url).href;

/** Everything said goes to a log file; the last lines are kept at hand. */
function collectOutput(child: ChildProcess, { name, logFolder, show }: ChildOptions): () => string {
  mkdirSync(logFolder, { recursive: true });
  const log = createWriteStream(path.join(logFolder, `${name}.log`));
  log.on("error", () => {}); // a full disk must not end the run
  let kept: string[] = [];
  let rest = "";
  const take = (chunk: string) => {
    log.write(chunk);
    const lines = (rest + chunk).split("\n");
    rest = lines.pop() ?? "";
    kept = [...kept, ...lines].slice(-keptLines);
    for (const line of show ? lines : []) show?.(`${name} | ${line}`);
  };
  for (const stream of [child.stdout, child.stderr]) stream?.setEncoding("utf8").on("data", take);
  child.once("close", () => log.end());
  return () => [...kept, rest].join("\n").trim();
}

/** Signals the child and whatever it started: it leads a process group of its own. */
function signalGroup(child: ChildProcess, signal: NodeJS.Signals): void {
  try {
    process.kill(-child.pid!, signal);
  } catch {
    // All of it is gone already.
  }
}

/** Starts one process of the product. In a group of its own, so that Ctrl-C in the terminal leaves the order to us. */
export function startChild(options: ChildOptions): Child {
  const program = ["--import", "tsx", "--import", stopWithParent, options.file, ...(options.args ?? [])];
  const child = spawn(process.execPath, program, {
    env: options.env,
    stdio: ["ignore", "pipe", "pipe", "ipc"],
    detached: true,
  });
  const lastLines = collectOutput(child, options);
  let over = false;
  const ended = new Promise<number | string>((resolve) => {
    child.once("error", (error) => resolve(error.message));
    // "close" comes when all it had to say has been read, so the last lines are whole.
    child.once("close", (code, signal) => resolve(code ?? signal ?? "unknown"));
  });
  child.once("exit", () => {
    over = true;
    // A grandchild may hold the pipes open and must not outlive its parent.
    setTimeout(() => signalGroup(child, "SIGKILL"), 500);
  });

  return {
    name: options.name,
    ended,
    hasEnded: () => over,
    lastLines,
    stop: async () => {
      if (over || child.pid === undefined) return;
      child.kill("SIGTERM");
      const impatience = setTimeout(() => signalGroup(child, "SIGKILL"), options.patience ?? 8000);
      await ended;
      clearTimeout(impatience);
    },
  };
}
