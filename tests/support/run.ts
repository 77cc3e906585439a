/* `npm test`: what the tests need, then the checks that take seconds, then the tests. Arguments go to vitest and leave
   the checks out, so that one file can be run alone. The last line printed is always `tests: N passed, …`. */
import { type ChildProcess, spawn } from "node:child_process";
import { requirePackage } from "#server/launch/debian-packages.ts";
import { requirePostgresPrograms } from "#server/launch/postgres-program.ts";
import { findChromium } from "./chromium.ts";

const checks = ["check:types", "check:lint", "check:imports", "check:dead", "check:migrations"];
const say = (line: string) => console.log(line);
let current: ChildProcess | undefined;
let interrupted = false;

/** The child's exit code; 1 when a signal ended it. */
function run(program: string, args: readonly string[]): Promise<number> {
  return new Promise((resolve, reject) => {
    current = spawn(program, args, { stdio: "inherit" });
    current.once("error", reject);
    current.once("exit", (code) => resolve(code ?? 1));
  });
}

/** Nothing ran: the closing line says so in the same form, counting what stopped us as the one failure. */
function stopBefore(reason: string): number {
  console.error(`\n${reason}`);
  console.log("\ntests: 0 passed, 1 failed, 0 skipped");
  return 1;
}

async function runAll(vitestArguments: readonly string[]): Promise<number> {
  try {
    await requirePostgresPrograms(say);
    await requirePackage("chromium", findChromium, say);
  } catch (error) {
    return stopBefore((error as Error).message);
  }
  if (vitestArguments.length === 0) {
    for (const check of checks) {
      say(`\n${check}`);
      const code = await run("npm", ["run", "--silent", check]);
      if (interrupted) return 130;
      if (code !== 0) return stopBefore(`${check} failed, so the tests were not run`);
    }
  }
  return run(process.execPath, ["node_modules/vitest/vitest.mjs", "run", ...vitestArguments]);
}

// A terminal sends Ctrl-C to the child as well: it cleans up, we wait for it. Other signals are passed on.
process.on("SIGINT", () => {
  interrupted = true;
});
for (const signal of ["SIGTERM", "SIGHUP"] as const) {
  process.on(signal, () => {
    interrupted = true;
    current?.kill("SIGINT");
  });
}
process.exitCode = await runAll(process.argv.slice(2));
