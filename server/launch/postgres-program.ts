import { type SpawnOptions, spawn, spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { chmodSync, chownSync, existsSync, mkdirSync, readdirSync, readFileSync, statSync } from "node:fs";
import path from "node:path";
import { requirePackage } from "./debian-packages.ts";
import { isRoot } from "./processes.ts";

const versionsFolder = "/usr/lib/postgresql";

/** The folder of the newest installed server. The client package alone makes the folder too, so look for both programs. */
function findPrograms(): string | undefined {
  if (!existsSync(versionsFolder)) return undefined;
  return readdirSync(versionsFolder)
    .sort((a, b) => Number(b) - Number(a))
    .map((version) => path.join(versionsFolder, version, "bin"))
    .find((bin) => existsSync(path.join(bin, "postgres")) && existsSync(path.join(bin, "initdb")));
}

export function requirePostgresPrograms(say: (line: string) => void): Promise<string> {
  return requirePackage("postgresql", findPrograms, say);
}

/** PostgreSQL refuses to run as root: root hands it to the system user its package made. */
export function postgresUser(): { uid: number; gid: number } | undefined {
  if (!isRoot()) return undefined;
  const line = readFileSync("/etc/passwd", "utf8")
    .split("\n")
    .find((entry) => entry.startsWith("postgres:"));
  if (!line) throw new Error("the system user postgres is missing: is Debian's package postgresql whole?");
  const [, , uid, gid] = line.split(":");
  return { uid: Number(uid), gid: Number(gid) };
}

/** The caller's folder may be closed to the other user, hence the root folder as the place to run from. */
export function asPostgresUser(options: SpawnOptions = {}): SpawnOptions {
  return { ...options, ...postgresUser(), cwd: "/" };
}

export function makeOwnFolder(folder: string): void {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const user = postgresUser();
  if (user) chownSync(folder, user.uid, user.gid);
  else if (statSync(folder).uid !== process.getuid?.())
    throw new Error(
      `${folder} belongs to another user. Was it made by a start as root? Use --data for a folder of your own.`,
    );
  chmodSync(folder, 0o700);
}

/** The wanted folder, or one beside the system's databases where a parent folder is closed to the postgres user. */
export function chooseDataFolder(wanted: string): string {
  const folder = path.resolve(wanted);
  mkdirSync(path.dirname(folder), { recursive: true });
  if (!isRoot()) return folder;
  const probe = spawnSync("/usr/bin/test", ["-x", path.dirname(folder)], { ...postgresUser(), cwd: "/" });
  if (probe.status === 0) return folder;
  const mark = createHash("sha256").update(folder).digest("hex").slice(0, 12);
  return `/var/lib/postgresql/tempermark-${mark}`;
}

/** Runs one of PostgreSQL's own commands to its end. */
export function runPostgresCommand(program: string, args: readonly string[]): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, asPostgresUser({ stdio: ["ignore", "ignore", "pipe"] }));
    let complaint = "";
    child.stderr?.on("data", (chunk) => {
      complaint += chunk;
    });
    child.once("error", reject);
    child.once("close", (code) =>
      code === 0 ? resolve() : reject(new Error(`${path.basename(program)} ended with ${code}\n${complaint}`)),
    );
  });
}
