import { existsSync } from "node:fs";
import { type Browser, chromium } from "playwright-core";

export const chromiumProgram = "/usr/bin/chromium";

export const findChromium = (): string | undefined => (existsSync(chromiumProgram) ? chromiumProgram : undefined);

const quiet = [
  "--disable-quic",
  "--disable-gpu",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

/** Debian's own Chromium, speaking to nobody but the pages under test. */
export function launchChromium(): Promise<Browser> {
  // Chromium's sandbox does not work for root.
  const args = process.getuid?.() === 0 ? ["--no-sandbox", ...quiet] : quiet;
  return chromium.launch({ executablePath: chromiumProgram, args, timeout: 60_000 });
}
