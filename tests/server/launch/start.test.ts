import { existsSync, readdirSync, readFileSync, readlinkSync, statSync } from "node:fs";
import path from "node:path";
import { afterAll, beforeAll, expect, test, vi } from "vitest";
import {
  findDescendants,
  listSurvivors,
  makeDataFolder,
  removeDataFolder,
  runStart,
  type StartRun,
} from "#tests/support/start-command.ts";

vi.setConfig({ testTimeout: 180_000, hookTimeout: 180_000 });

const folder = makeDataFolder();
const args = ["--data", folder, "--port", "0", "--no-seed"];
let run: StartRun;
let address: string;

beforeAll(async () => {
  run = runStart(args);
  address = await run.ready;
});
afterAll(async () => {
  run.child.kill("SIGTERM");
  await run.exit;
  removeDataFolder(folder);
});

/** Inodes of the sockets a process holds. */
function socketsOf(pid: number): Set<string> {
  const links = readdirSync(`/proc/${pid}/fd`).map((fd) => {
    try {
      return readlinkSync(`/proc/${pid}/fd/${fd}`);
    } catch {
      return "";
    }
  });
  return new Set(links.flatMap((link) => /^socket:\[(\d+)\]$/.exec(link)?.[1] ?? []));
}

test("the application, the API and the sign-in stand-in answer", async () => {
  expect((await fetch(`${address}/readyz`)).status).toBe(200);
  expect(await (await fetch(address)).text()).toContain("<!doctype html>");
  const signIn = await fetch(`${address}/auth/sign-in`, { redirect: "manual" });
  expect(signIn.status).toBe(302);
  const chooser = await fetch(new URL(signIn.headers.get("location") ?? ""), { redirect: "manual" });
  expect(chooser.headers.get("location")).toMatch(/^\/sign-in\//);
});

test("nothing listens beyond this machine", () => {
  const pids = new Set(findDescendants(run.child.pid!).map(({ pid }) => pid));
  expect(pids.size).toBeGreaterThanOrEqual(4);
  for (const pid of pids) {
    // Fields of /proc/net/tcp: local address in hexadecimal, state 0A for listening. Any address but 127.0.0.1 is a mistake.
    const own = socketsOf(pid);
    const tables = ["tcp", "tcp6"].flatMap((name) => readFileSync(`/proc/net/${name}`, "utf8").split("\n").slice(1));
    const listening = tables
      .map((line) => line.trim().split(/\s+/))
      .filter((f) => f[3] === "0A" && own.has(f[9] ?? ""));
    for (const fields of listening) expect(fields[1]).toMatch(/^0100007F:/);
  }
});

test("a second start in the same folder is refused and says where the first is", async () => {
  const second = runStart(args);
  expect(await second.exit).toBe(1);
  expect(second.output()).toContain(`already running in this folder at ${address}`);
  expect((await fetch(`${address}/readyz`)).status).toBe(200);
});

test("passwords are readable by their owner alone and are printed nowhere", () => {
  const file = path.join(folder, "secrets.json");
  expect(statSync(file).mode & 0o777).toBe(0o600);
  const secrets = Object.values<string>(JSON.parse(readFileSync(file, "utf8")));
  expect(new Set(secrets).size).toBe(7);
  const logs = ["api", "worker", "sign-in"].map((name) =>
    readFileSync(path.join(folder, "logs", `${name}.log`), "utf8"),
  );
  for (const secret of secrets) expect([run.output(), ...logs].filter((text) => text.includes(secret))).toEqual([]);
});

test("a second SIGTERM while stopping changes nothing: no process and no lock is left", async () => {
  const processes = findDescendants(run.child.pid!);
  run.child.kill("SIGTERM");
  run.child.kill("SIGTERM");
  expect(await run.exit).toBe(0);
  expect(await listSurvivors(processes)).toEqual([]);
  expect(existsSync(path.join(folder, "start.lock"))).toBe(false);
  expect(existsSync(path.join(folder, "pgdata", "postmaster.pid"))).toBe(false);
});
