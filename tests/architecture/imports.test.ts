import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, expect, test } from "vitest";

const repository = path.resolve(import.meta.dirname, "../..");
const folder = mkdtempSync(path.join(tmpdir(), "imports-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function plant(files: Record<string, string>): void {
  for (const [name, code] of Object.entries(files)) {
    mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
    writeFileSync(path.join(folder, name), code);
  }
}

/** Names of the rules broken in the planted project, with the file that breaks each. */
function findBreaches(): string[] {
  const program = path.join(repository, "node_modules/.bin/depcruise");
  const config = path.join(repository, "tests/architecture/imports.cjs");
  const args = ["--config", config, "--output-type", "json", "src", "server", "shared", "oidc-fake"];
  const { stdout } = spawnSync(program, args, { cwd: folder, encoding: "utf8", maxBuffer: 2 ** 26 });
  const found: { rule: { name: string }; from: string }[] = JSON.parse(stdout).summary.violations;
  return found.map(({ rule, from }) => `${rule.name}: ${from}`).sort();
}

symlinkSync(path.join(repository, "node_modules"), path.join(folder, "node_modules"));
const lawful = {
  "package.json": JSON.stringify({ type: "module", imports: { "#shared/*": "./shared/*", "#server/*": "./server/*" } }),
  "tsconfig.json": readFileSync(path.join(repository, "tsconfig.json"), "utf8"),
  "shared/stats/mean.ts": "export const mean = 1;",
  "shared/units/length.ts":
    'import { z } from "zod"; import { mean } from "../stats/mean.ts"; export const length = [z, mean];',
  "src/main.tsx": 'import "./features/a/a-page.tsx"; import "./features/b/b-page.tsx";',
  "src/lib/api.ts": 'import { length } from "#shared/units/length.ts"; export const api = length;',
  "src/features/a/a-page.tsx": 'import { api } from "../../lib/api.ts"; export const a = api;',
  "src/features/b/b-page.tsx": "export const b = 1;",
  "server/db/schema/a.ts": 'import { pgTable } from "drizzle-orm/pg-core"; export const a = pgTable;',
  "server/features/a/a.queries.ts": 'import { a } from "../../db/schema/a.ts"; export const rows = a;',
  "server/features/a/a.service.ts":
    'import { rows } from "./a.queries.ts"; import { serveB } from "../b/b.service.ts"; export const serveA = [rows, serveB];',
  "server/features/a/a.router.ts": 'import { serveA } from "./a.service.ts"; export const router = serveA;',
  "server/features/b/b.service.ts": "export const serveB = 1;",
  "server/features/b/b.queries.ts": "export const rows = 1;",
  "server/launch/start.ts": 'import { demo } from "../../oidc-fake/accounts.ts"; export const start = demo;',
  "oidc-fake/accounts.ts": "export const demo = 1;",
  "oidc-fake/server.ts": "export const provider = 1;",
  "tests/support/render.ts": "export const render = 1;",
};

/** One file per rule that breaks it, and only it. */
const breaches: Record<string, [file: string, code: string]> = {
  "no-cycles": ["src/ui/ring.ts", 'import { ring } from "./ring.ts"; export { ring };'],
  "everything-imported-exists": ["src/ui/lost.ts", 'import "./nowhere.ts";'],
  "shared-imports-shared": ["shared/units/breach.ts", 'import "../../src/lib/api.ts";'],
  "shared-uses-pure-packages": ["shared/units/package.ts", 'import "express";'],
  "shared-is-not-node": ["shared/units/node.ts", 'import "node:fs";'],
  "stats-import-stats": ["shared/stats/breach.ts", 'import "../units/length.ts";'],
  "client-not-server": ["src/lib/breach.ts", 'import "#server/features/b/b.service.ts";'],
  "client-is-not-node": ["src/lib/node.ts", 'import "node:fs";'],
  "server-not-client": ["server/http/breach.ts", 'import "../../src/lib/api.ts";'],
  "stand-in-for-start-and-seed-only": ["server/http/accounts.ts", 'import "../../oidc-fake/accounts.ts";'],
  "start-and-seed-know-accounts-only": ["server/seed/breach.ts", 'import "../../oidc-fake/server.ts";'],
  "stand-in-stands-alone": ["oidc-fake/breach.ts", 'import "#shared/units/length.ts";'],
  "product-not-tests": ["src/lib/support.ts", 'import "../../tests/support/render.ts";'],
  "product-not-launch": ["server/http/launch.ts", 'import "../launch/start.ts";'],
  "client-features-apart": ["src/features/a/breach.ts", 'import "../b/b-page.tsx";'],
  "client-parts-know-no-feature": ["src/ui/breach.ts", 'import "../features/b/b-page.tsx";'],
  "server-features-meet-in-services": ["server/features/a/other.service.ts", 'import "../b/b.queries.ts";'],
  "only-services-call-other-features": ["server/features/a/other.router.ts", 'import "../b/b.service.ts";'],
  "sql-in-queries-only": ["server/http/sql.ts", 'import "pg";'],
  "routers-call-services": ["server/features/a/breach.router.ts", 'import "./a.queries.ts";'],
};

plant(lawful);
const lawfulBreaches = findBreaches();
plant(Object.fromEntries(Object.values(breaches)));
const plantedBreaches = findBreaches();

test("a lawful project breaks no rule", () => {
  expect(lawfulBreaches).toEqual([]);
});

test("every planted breach is found, and nothing else", () => {
  const expected = Object.entries(breaches).map(([rule, [file]]) => `${rule}: ${file}`);
  expect(plantedBreaches).toEqual(expected.sort());
});

test("every rule has a breach planted", () => {
  const config: { forbidden: { name: string }[] } = createRequire(import.meta.url)("./imports.cjs");
  const names = config.forbidden.map(({ name }) => name);
  expect(Object.keys(breaches).sort()).toEqual([...names].sort());
});
