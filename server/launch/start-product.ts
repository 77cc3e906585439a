import path from "node:path";
import { commandEnvironmentFile } from "../command-environment.ts";
import { bootstrapDatabase, roles } from "../db/bootstrap.ts";
import { migrateDatabase } from "../db/migrate.ts";
import { type Child, type ChildOptions, startChild } from "./children.ts";
import { dropUnfinishedDemo, isEmptyDatabase, whileMarkedUnfinished } from "./demo-data.ts";
import type { StartOptions } from "./options.ts";
import { type ReservedPort, reservePort } from "./ports.ts";
import { type PostgresServer, startPostgres } from "./postgres.ts";
import type { Running } from "./running.ts";
import { loadSecrets, type Secrets, writePrivateFile } from "./secrets.ts";
import { waitUntilAnswering } from "./wait-for.ts";
import { ensureWebBuild, viteProgram, webFolder } from "./web-build.ts";

export interface Product {
  address: string;
  logFolder: string;
  /** Resolves with a report when a part ends that was not asked to. */
  crashed: Promise<string>;
}

type Say = (line: string) => void;

const database = "tempermark";
const preferredPorts = { api: 4301, signIn: 4310, postgres: 54_329 };

/** The ports of one run, held until their users start. */
interface Ports {
  web: ReservedPort;
  /** The same as `web` unless Vite stands in front. */
  api: ReservedPort;
  signIn: ReservedPort;
}

async function reservePorts(options: StartOptions): Promise<Ports> {
  const web = await reservePort(options.port);
  const api = options.dev ? await reservePort(preferredPorts.api) : web;
  return { web, api, signIn: await reservePort(preferredPorts.signIn) };
}

function makeEnvironment(postgres: PostgresServer, secrets: Secrets, ports: Ports): NodeJS.ProcessEnv {
  return {
    ...process.env,
    NODE_ENV: "development",
    HOST: "127.0.0.1",
    PORT: String(ports.api.port),
    PUBLIC_URL: `http://127.0.0.1:${ports.web.port}`,
    DATABASE_URL: postgres.urlFor(roles.web, secrets.web, database),
    EDITION_DATABASE_URL: postgres.urlFor(roles.editionBuilder, secrets.editionBuilder, database),
    EDITION_MARKS_KEY: secrets.editionMarks,
    OIDC_ISSUER: `http://127.0.0.1:${ports.signIn.port}`,
    OIDC_CLIENT_ID: "tempermark",
    OIDC_CLIENT_SECRET: secrets.oidcClient,
    OIDC_PROVIDER_NAME: "demo", // stored with accounts: the issuer's port may differ from start to start
    SESSION_SECRET: secrets.session,
    WEB_DIR: webFolder,
    DEMO: "1",
  };
}

/** For commands given beside the running product, such as `npm run edition`. */
function leaveForCommands(
  folder: string,
  ownerUrl: string,
  { EDITION_DATABASE_URL, EDITION_MARKS_KEY }: NodeJS.ProcessEnv,
): void {
  const settings = { OWNER_DATABASE_URL: ownerUrl, EDITION_DATABASE_URL, EDITION_MARKS_KEY };
  writePrivateFile(commandEnvironmentFile(folder), `${JSON.stringify(settings, null, 2)}\n`);
}

async function prepareDatabase(postgres: PostgresServer, secrets: Secrets, say: Say): Promise<void> {
  if (await dropUnfinishedDemo(postgres.superuserUrl, database)) say("the last filling was cut short: beginning anew");
  await bootstrapDatabase(postgres.superuserUrl, { database, passwords: secrets });
  await migrateDatabase(postgres.urlFor(roles.owner, secrets.owner, database));
}

/** Starts the parts one after the other and watches them. */
class Launcher {
  readonly crashed: Promise<string>;
  private report: (text: string) => void = () => {};
  private readonly running: Running;
  private readonly common: Pick<ChildOptions, "logFolder" | "env"> & { show?: Say };

  constructor(running: Running, common: Launcher["common"]) {
    this.running = running;
    this.common = common;
    this.crashed = new Promise((resolve) => {
      this.report = resolve;
    });
  }

  /** A part that runs until it is stopped; ending by itself is a crash, whatever its exit code. */
  async startPart(
    name: string,
    file: string,
    env: NodeJS.ProcessEnv = {},
    args: readonly string[] = [],
  ): Promise<Child> {
    const child = startChild({ name, file, args, ...this.common, env: { ...this.common.env, ...env } });
    void child.ended.then((code) =>
      this.report(`${name} ended unexpectedly (${code}). Its last lines:\n${child.lastLines()}`),
    );
    await this.running.add(child.stop);
    return child;
  }

  /** A command that runs to its end. */
  async runCommand(name: string, file: string, env: NodeJS.ProcessEnv, say: Say): Promise<void> {
    const show = (line: string) => say(line.replace(/^.*? \| /, "  "));
    const child = startChild({ name, file, ...this.common, env: { ...this.common.env, ...env }, show });
    await this.running.add(child.stop);
    const code = await child.ended;
    if (code !== 0) throw new Error(`${name} failed (${code})\n${child.lastLines()}`);
  }

  watchPostgres(postgres: PostgresServer): void {
    void postgres.ended.then((log) => this.report(`PostgreSQL ended unexpectedly. Its last lines:\n${log}`));
  }
}

async function fillWithDemo(launcher: Launcher, postgres: PostgresServer, secrets: Secrets, say: Say): Promise<void> {
  const url = new URL(postgres.superuserUrl);
  url.pathname = `/${database}`;
  if (!(await isEmptyDatabase(url.href))) return;
  say("filling the empty database with the demo network (once)");
  const env = { OWNER_DATABASE_URL: postgres.urlFor(roles.owner, secrets.owner, database) };
  await whileMarkedUnfinished(postgres.superuserUrl, database, () =>
    launcher.runCommand("seed", "server/seed/main.ts", env, say),
  );
}

async function startParts(launcher: Launcher, ports: Ports, folder: string, dev: boolean): Promise<void> {
  await ports.signIn.release();
  const signIn = await launcher.startPart("sign-in", "oidc-fake/main.ts", {
    OIDC_FAKE_PORT: String(ports.signIn.port),
    OIDC_FAKE_KEY_FILE: path.join(folder, "sign-in-key.json"),
  });
  await waitUntilAnswering(`http://127.0.0.1:${ports.signIn.port}/.well-known/openid-configuration`, signIn);
  await ports.api.release();
  const api = await launcher.startPart("api", "server/main.ts");
  await launcher.startPart("worker", "server/worker.ts");
  const apiAddress = `http://127.0.0.1:${ports.api.port}`;
  await waitUntilAnswering(`${apiAddress}/readyz`, api);
  if (!dev) return;
  await ports.web.release();
  const args = ["--port", String(ports.web.port), "--strictPort", "--host", "127.0.0.1"];
  const vite = await launcher.startPart("vite", viteProgram, { API_TARGET: apiAddress }, args);
  await waitUntilAnswering(`http://127.0.0.1:${ports.web.port}/`, vite);
}

export async function startProduct(
  options: StartOptions,
  folder: string,
  running: Running,
  say: Say,
): Promise<Product> {
  const logFolder = path.join(folder, "logs");
  if (!options.dev) await ensureWebBuild(logFolder, say, (child) => void running.add(child.stop).catch(() => {}));
  const secrets = loadSecrets(folder);
  say("starting the database");
  const postgres = await startPostgres({
    dataFolder: path.join(folder, "pgdata"),
    superuserPassword: secrets.superuser,
    port: preferredPorts.postgres,
    say,
  });
  await running.add(postgres.stop);
  await prepareDatabase(postgres, secrets, say);
  const ports = await reservePorts(options);
  const env = makeEnvironment(postgres, secrets, ports);
  leaveForCommands(folder, postgres.urlFor(roles.owner, secrets.owner, database), env);
  const launcher = new Launcher(running, { logFolder, env, ...(options.dev ? { show: say } : {}) });
  launcher.watchPostgres(postgres);
  if (options.seed) await fillWithDemo(launcher, postgres, secrets, say);
  say("starting sign-in, API and worker");
  await startParts(launcher, ports, folder, options.dev);
  return { address: `http://127.0.0.1:${ports.web.port}`, logFolder, crashed: launcher.crashed };
}
