/* `npm run edition -- build | publish | list`: editions without the job runner and without a browser. */
import { parseArgs } from "node:util";
import { readCommandEnvironment } from "#server/command-environment.ts";
import { violates } from "#server/db/client.ts";
import { openSession } from "#server/db/session.ts";
import { readWorkerSettings, type WorkerSettings } from "#server/worker-env.ts";
import { listEditions, publishEdition } from "./publication.service.ts";
import { type BuildResult, runDirectBuild } from "./run-build.ts";

const help = `Builds and publishes editions.

  npm run edition -- build             build one now; members see nothing of it yet
  npm run edition -- build --publish   the same, then publish it
  npm run edition -- publish           publish the newest built one
  npm run edition -- list              every edition, newest first

  --data DIR   folder of the start command, whose database is used unless EDITION_DATABASE_URL is set (.local)`;

const say = (line: string) => console.log(line);

async function build(settings: WorkerSettings): Promise<string> {
  const result = await refuseQueued(
    runDirectBuild({ url: settings.EDITION_DATABASE_URL, marksKey: settings.EDITION_MARKS_KEY }, { onProgress: show }),
  );
  if (result.outcome === "failed") throw new Error(result.message, { cause: result.error });
  if (result.outcome !== "done") throw new Error("An edition is being built already.");
  say(`Edition ${result.number} is built.`);
  return result.editionId;
}

async function refuseQueued(work: Promise<BuildResult>): Promise<BuildResult> {
  try {
    return await work;
  } catch (error) {
    if (!violates(error, "edition_builds_one_open")) throw error;
    throw new Error("A build is queued already: the job runner will take it.");
  }
}

let shown = -1;
function show(done: number, total: number): void {
  const tenth = total === 0 ? 10 : Math.floor((10 * done) / total);
  if (tenth > shown) say(`${done} of ${total} groups`);
  shown = Math.max(shown, tenth);
}

/** @param id  left out: the newest that waits to be published */
async function publish(url: string, id?: string): Promise<void> {
  const session = await openSession(url);
  try {
    const edition = await session.db.transaction(async (tx) => {
      const wanted = id ?? (await listEditions(tx)).find(({ state }) => state === "built")?.id;
      if (!wanted) throw new Error("No edition waits to be published.");
      return publishEdition(tx, { userId: null }, wanted);
    });
    say(`Edition ${edition.number} is published. Groups shown: ${edition.releasedGroups}.`);
  } finally {
    await session.end();
  }
}

async function list(url: string): Promise<void> {
  const session = await openSession(url);
  try {
    const editions = await listEditions(session.db);
    if (editions.length === 0) say("There is no edition yet.");
    for (const { number, state, date, releasedGroups } of editions) {
      say(`${String(number).padStart(4)}  ${date}  ${state.padEnd(9)}  groups shown: ${releasedGroups}`);
    }
  } finally {
    await session.end();
  }
}

async function main(): Promise<void> {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: {
      publish: { type: "boolean", default: false },
      data: { type: "string", default: ".local" },
      help: { type: "boolean", short: "h", default: false },
    },
  });
  const [command] = positionals;
  if (values.help || positionals.length !== 1 || !["build", "publish", "list"].includes(command ?? "")) {
    say(help);
    process.exitCode = values.help ? 0 : 1;
    return;
  }
  const settings = readWorkerSettings(readCommandEnvironment(values.data, "EDITION_DATABASE_URL"));
  if (command === "list") return list(settings.EDITION_DATABASE_URL);
  if (command === "publish") return publish(settings.EDITION_DATABASE_URL);
  const id = await build(settings);
  if (values.publish) await publish(settings.EDITION_DATABASE_URL, id);
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});
