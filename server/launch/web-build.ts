import { existsSync, mkdirSync, readdirSync, statSync } from "node:fs";
import path from "node:path";
import { type Child, startChild } from "./children.ts";
import { withLock } from "./lock.ts";

export const webFolder = "dist/web";
export const viteProgram = "node_modules/vite/bin/vite.js";

const sources = ["src", "shared", "public", "index.html", "vite.config.ts", "tailwind.config.ts", "package-lock.json"];

/** Milliseconds since the epoch. A folder changes too when a file in it is removed. */
function newestChange(entry: string): number {
  if (!existsSync(entry)) return 0;
  const stats = statSync(entry);
  if (!stats.isDirectory()) return stats.mtimeMs;
  return Math.max(stats.mtimeMs, ...readdirSync(entry).map((name) => newestChange(path.join(entry, name))));
}

function isBuilt(): boolean {
  const page = path.join(webFolder, "index.html");
  return existsSync(page) && statSync(page).mtimeMs > Math.max(...sources.map(newestChange));
}

/** Builds the web application unless the built one is newer than all it is made from. */
export async function ensureWebBuild(
  logFolder: string,
  say: (line: string) => void,
  onStarted: (child: Child) => void,
): Promise<void> {
  if (isBuilt()) return;
  mkdirSync("dist", { recursive: true });
  await withLock("dist/web-build.lock", async () => {
    if (isBuilt()) return;
    say("building the web application");
    const env = { ...process.env, NODE_ENV: "production" };
    const child = startChild({ name: "build", file: viteProgram, args: ["build"], env, logFolder });
    onStarted(child);
    const code = await child.ended;
    if (code !== 0) throw new Error(`the web application could not be built (${code})\n${child.lastLines()}`);
  });
}
