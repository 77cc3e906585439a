/* Fails when the tables in server/db/schema/ say something the migrations in drizzle/ do not: somebody forgot
   `npm run db:generate`. Generates into a copy, so the checkout stays as it is. */
import { spawnSync } from "node:child_process";
import { cpSync, existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";

const localFolder = ".local";
mkdirSync(localFolder, { recursive: true });
const folder = mkdtempSync(path.join(localFolder, "migration-drift-"));

function listSql(out: string): string[] {
  return readdirSync(out).filter((name) => name.endsWith(".sql"));
}

/** The new SQL drizzle-kit would write, or an empty text. */
function findDrift(): string {
  const out = path.join(folder, "drizzle");
  if (existsSync("drizzle")) cpSync("drizzle", out, { recursive: true });
  const known = new Set(existsSync(out) ? listSql(out) : []);
  const config = path.join(folder, "drizzle.config.ts");
  const base = path.resolve("drizzle.config.ts");
  writeFileSync(
    config,
    `import base from ${JSON.stringify(base)};\nexport default { ...base, out: ${JSON.stringify(`./${out}`)} };\n`,
  );
  // Without a terminal it cannot ask whether a column was renamed; it then fails, and that is drift as well.
  const { status, stdout, stderr } = spawnSync("node_modules/.bin/drizzle-kit", ["generate", "--config", config], {
    encoding: "utf8",
    stdio: ["ignore", "pipe", "pipe"],
  });
  const added = listSql(out).filter((name) => !known.has(name));
  if (added.length === 0 && status === 0 && /No schema changes/.test(stdout)) return "";
  return [...added.map((name) => readFileSync(path.join(out, name), "utf8")), status === 0 ? "" : stdout, stderr].join(
    "\n",
  );
}

try {
  const drift = findDrift();
  if (drift) {
    console.error(`The schema has moved away from the migrations. Run: npm run db:generate\n\n${drift}`);
    process.exitCode = 1;
  }
} finally {
  rmSync(folder, { recursive: true, force: true });
}
