import { randomBytes } from "node:crypto";
import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";

const Secret = z.string().min(32);

/** Every password of one local installation. Random, made once, readable by its owner alone. */
export const Secrets = z.object({
  superuser: Secret,
  owner: Secret,
  web: Secret,
  editionBuilder: Secret,
  session: Secret,
  oidcClient: Secret,
});
export type Secrets = z.infer<typeof Secrets>;

export function generateSecrets(): Secrets {
  const secret = () => randomBytes(32).toString("base64url");
  return {
    superuser: secret(),
    owner: secret(),
    web: secret(),
    editionBuilder: secret(),
    session: secret(),
    oidcClient: secret(),
  };
}

/** Whole or not at all: a run cut short must not leave half a file in place of the passwords. */
export function writePrivateFile(file: string, content: string): void {
  const draft = `${file}.${process.pid}`;
  writeFileSync(draft, content, { mode: 0o600 });
  renameSync(draft, file);
}

export function loadSecrets(folder: string): Secrets {
  const file = path.join(folder, "secrets.json");
  if (!existsSync(file)) writePrivateFile(file, `${JSON.stringify(generateSecrets(), null, 2)}\n`);
  return Secrets.parse(JSON.parse(readFileSync(file, "utf8")));
}
