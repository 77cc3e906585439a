import { spawn } from "node:child_process";
import { isRoot } from "./processes.ts";

const installCommand = (name: string): string => `apt-get update && apt-get install -y ${name}`;

/** Runs a program to its end and shows what it says; its own process group is ours, so Ctrl-C reaches it. */
function run(program: string, args: readonly string[]): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
      stdio: ["ignore", "ignore", "inherit"],
    });
    child.once("error", reject);
    child.once("exit", (code) => (code === 0 ? resolve() : reject(new Error(`${program} ended with ${code}`))));
  });
}

/** What a person who may not install is told: the one command that does. */
export class MissingPackageError extends Error {
  constructor(name: string) {
    super(`${name} is not installed. Run once:\n  sudo sh -c "${installCommand(name)}"`);
  }
}

/**
 * Finds something a Debian package brings, and installs the package when it is missing and we may.
 * @param find  undefined while it is missing
 */
export async function requirePackage<Found>(
  name: string,
  find: () => Found | undefined,
  say: (line: string) => void,
): Promise<Found> {
  const present = find();
  if (present !== undefined) return present;
  if (!isRoot()) throw new MissingPackageError(name);
  say(`${name} is missing: installing Debian's package (about half a minute)`);
  await run("apt-get", ["update", "-qq"]);
  await run("apt-get", ["install", "-y", "-qq", "--no-install-recommends", name]);
  const installed = find();
  if (installed === undefined)
    throw new Error(`Debian's package ${name} is installed but brought not what was expected`);
  return installed;
}
