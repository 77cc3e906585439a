/* Runs the stand-in sign-in provider as a process of its own: `node --import tsx oidc-fake/main.ts`. */
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import type { JWK } from "jose";
import { z } from "zod";
import { generateSigningKey } from "./provider.ts";
import { startOidcFake } from "./server.ts";

const Settings = z.object({
  OIDC_FAKE_PORT: z.coerce.number().int().min(0).max(65_535).default(4310),
  OIDC_CLIENT_ID: z.string().min(1),
  OIDC_CLIENT_SECRET: z.string().min(16),
  /** Where the application is reached. */
  PUBLIC_URL: z.url(),
  /** Keeps the signing key over restarts, so that people signed in before can still sign out. */
  OIDC_FAKE_KEY_FILE: z.string().optional(),
});

async function loadSigningKey(file: string | undefined): Promise<JWK> {
  if (file && existsSync(file)) return JSON.parse(readFileSync(file, "utf8"));
  const key = await generateSigningKey();
  if (file) writeFileSync(file, JSON.stringify(key), { mode: 0o600 });
  return key;
}

const settings = Settings.parse(process.env);
const provider = await startOidcFake({
  port: settings.OIDC_FAKE_PORT,
  clientId: settings.OIDC_CLIENT_ID,
  clientSecret: settings.OIDC_CLIENT_SECRET,
  redirectUris: [new URL("/auth/callback", settings.PUBLIC_URL).href],
  postLogoutUris: [new URL("/", settings.PUBLIC_URL).href],
  signingKey: await loadSigningKey(settings.OIDC_FAKE_KEY_FILE),
});
console.log(`stand-in sign-in provider at ${provider.issuer}`);

let stopping = false;
for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
  process.on(signal, async () => {
    if (stopping) return;
    stopping = true;
    await provider.stop();
    process.exit(0);
  });
}
