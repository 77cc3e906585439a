/* `npm run seed -- --shops N`: fills an empty database with an invented network. */
import { parseArgs } from "node:util";
import { z } from "zod";
import { readCommandEnvironment } from "../command-environment.ts";
import { parseSettings } from "../settings.ts";
import { WorkerSettings } from "../worker-env.ts";
import { seedDemo } from "./seed-demo.ts";

const help = `Fills an empty database with the demo network.

  npm run seed -- --shops N   so many shops (68), about 24 recipes each

  --data DIR   folder of the start command, whose database is used unless OWNER_DATABASE_URL is set (.local).
               Start it with --no-seed first, so that its database is there and empty.`;

/** The demo network comes with editions, so what builds those is needed as well. */
const SeedSettings = WorkerSettings.extend({ OWNER_DATABASE_URL: z.string().min(1) });

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: {
      shops: { type: "string", default: "68" },
      data: { type: "string", default: ".local" },
      help: { type: "boolean", short: "h", default: false },
    },
  });
  if (values.help) return console.log(help);
  const shops = Number(values.shops);
  if (!Number.isInteger(shops) || shops < 10 || shops > 50_000)
    throw new Error("--shops wants a whole number from 10 to 50000");
  const settings = parseSettings(SeedSettings, readCommandEnvironment(values.data, "OWNER_DATABASE_URL"));
  await seedDemo({
    ownerUrl: settings.OWNER_DATABASE_URL,
    editionUrl: settings.EDITION_DATABASE_URL,
    marksKey: settings.EDITION_MARKS_KEY,
    shops,
    say: (line) => console.log(line),
  });
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});
