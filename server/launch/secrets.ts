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
  /** Ties a shop to its mark in published editions: a new one would break that tie. */
  editionMarks: Secret,
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
    editionMarks: secret(),
  };
}

/** Whole or not at all: a run cut short must not leave half a file in place of the passwords. */
export function writePrivateFile(file: string, content: string): void {
  const draft = `${file}.${process.pid}`;
  writeFileSync(draft, content, { mode: 0o600 });
  renameSync(draft, file);
}

/** Makes what is missing, be it all of it or one that a newer version needs; never replaces one. */
export function loadSecrets(folder: string): Secrets {
  const file = path.join(folder, "secrets.json");
  const known: unknown = existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : {};
  const secrets = Secrets.parse({ ...generateSecrets(), ...Secrets.partial().parse(known) });
  if (JSON.stringify(secrets) !== JSON.stringify(known))
    writePrivateFile(file, `${JSON.stringify(secrets, null, 2)}\n`);
  return secrets;
}
