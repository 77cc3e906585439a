import type { Child } from "./children.ts";
import { delay } from "./processes.ts";

/** Milliseconds. A cold start compiles TypeScript on a busy machine. */
const patience = 90_000;

/** Waits until the address answers with success; ends at once when the process behind it has ended. */
export async function waitUntilAnswering(url: string, child: Child): Promise<void> {
  const deadline = Date.now() + patience;
  let last = "no answer";
  while (Date.now() < deadline) {
    if (child.hasEnded())
      throw new Error(`${child.name} ended while starting (${await child.ended})\n${child.lastLines()}`);
    try {
      const response = await fetch(url, { signal: AbortSignal.timeout(2000) });
      await response.body?.cancel();
      if (response.ok) return;
      last = `status ${response.status}`;
    } catch {
      last = "no answer";
    }
    await delay(100);
  }
  throw new Error(`${child.name} did not become ready at ${url}: ${last}\n${child.lastLines()}`);
}
