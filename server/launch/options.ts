import { parseArgs } from "node:util";

export interface StartOptions {
  /** Vite's development server in front, which reloads the page as files change. */
  dev: boolean;
  seed: boolean;
  /** Folder of the database, the passwords and the logs. */
  data: string;
  /** Preferred port of the application on 127.0.0.1; another is found when it is taken. 0 for any. */
  port: number;
}

export const help = `Starts all of Tempermark on this machine: database, sign-in stand-in, API, worker and web application.

  npm start                  the built application
  npm run dev                the same, reloading as files change
  npm start -- [options]

  --port N     preferred port of the application (4300); another free one is taken when it is in use
  --data DIR   where database, passwords and logs are kept (.local)
  --no-seed    leave a new database empty instead of filling it with the demo network
  --help       this text

Everything listens on 127.0.0.1 only. Ctrl-C stops all of it; the data stays for the next start.`;

/** @returns undefined when help was asked for */
export function parseStartOptions(args: readonly string[]): StartOptions | undefined {
  const { values } = parseArgs({
    args: [...args],
    options: {
      dev: { type: "boolean", default: false },
      "no-seed": { type: "boolean", default: false },
      data: { type: "string", default: ".local" },
      port: { type: "string", default: "4300" },
      help: { type: "boolean", short: "h", default: false },
    },
  });
  if (values.help) return undefined;
  const port = Number(values.port);
  if (!/^\d+$/.test(values.port) || port > 65_535)
    throw new Error(`--port wants a number from 0 to 65535, not "${values.port}"`);
  return { dev: values.dev, seed: !values["no-seed"], data: values.data, port };
}
