/* `npm run seed -- --shops N`: fills an empty database with an invented network. */
import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import { seedDemo } from "./seed-demo.ts";

const help = `Fills an empty database with the demo network.

  npm run seed -- --shops N   so many shops (66), about 24 recipes each

  --data DIR   folder of the start command, whose database is used unless OWNER_DATABASE_URL is set (.local).
               Start it with --no-seed first, so that its database is there and empty.`;

function readEnvironment(dataFolder: string): Record<string, string | undefined> {
  const file = path.join(dataFolder, "environment.json");
  if (process.env.OWNER_DATABASE_URL || !existsSync(file)) return process.env;
  return { ...JSON.parse(readFileSync(file, "utf8")), ...process.env };
}

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: {
      shops: { type: "string", default: "66" },
      data: { type: "string", default: ".local" },
      help: { type: "boolean", short: "h", default: false },
    },
  });
  if (values.help) return console.log(help);
  const shops = Number(values.shops);
  if (!Number.isInteger(shops) || shops < 10 || shops > 50_000)
    throw new Error("--shops wants a whole number from 10 to 50000");
  const environment = readEnvironment(values.data);
  const { OWNER_DATABASE_URL: ownerUrl, EDITION_DATABASE_URL: editionUrl, EDITION_MARKS_KEY: marksKey } = environment;
  if (!ownerUrl || !editionUrl || !marksKey) {
    throw new Error(
      "Set OWNER_DATABASE_URL, EDITION_DATABASE_URL and EDITION_MARKS_KEY, or run the start command first",
    );
  }
  await seedDemo({ ownerUrl, editionUrl, marksKey, shops, say: (line) => console.log(line) });
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});
