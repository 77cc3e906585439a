/* `npm start` and `npm run dev`: the whole product on one machine, nothing left behind when it ends. */
import { mkdirSync } from "node:fs";
import path from "node:path";
import { acquireLock } from "./lock.ts";
import { help, parseStartOptions, type StartOptions } from "./options.ts";
import { Running, StoppedError } from "./running.ts";
import { startProduct } from "./start-product.ts";
import { welcome } from "./welcome.ts";

const say = (line: string) => console.log(line);

async function start(options: StartOptions): Promise<void> {
  const running = new Running();
  const end = async (code: number) => {
    if (running.isEnding) return;
    process.exitCode = code;
    await running.stopAll();
    process.exit();
  };
  // npm passes signals on as well, so each may come twice: the second must not cut the stopping short.
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
    process.on(signal, () => {
      if (!running.isEnding) say("stopping");
      void end(0);
    });
  }
  // The terminal may be gone before us.
  for (const stream of [process.stdout, process.stderr]) stream.on("error", () => {});

  try {
    const folder = path.resolve(options.data);
    mkdirSync(folder, { recursive: true });
    const lock = acquireLock(path.join(folder, "start.lock"));
    await running.add(lock.release);
    const product = await startProduct(options, folder, running, say);
    void product.crashed.then((report) => {
      if (running.isEnding) return;
      console.error(report);
      void end(1);
    });
    lock.announce(product.address);
    const logFolder = path.relative(process.cwd(), product.logFolder);
    say(welcome(product.address, logFolder.startsWith("..") ? product.logFolder : logFolder));
  } catch (error) {
    if (!(error instanceof StoppedError) && !running.isEnding) console.error((error as Error).message);
    await end(1);
  }
}

async function main(): Promise<void> {
  if (process.env.NODE_ENV === "production")
    throw new Error(
      "This command is for development and demonstration: it refuses NODE_ENV=production. See README.md, Production.",
    );
  const options = parseStartOptions(process.argv.slice(2));
  if (options) await start(options);
  else say(help);
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});
