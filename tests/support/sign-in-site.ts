import http from "node:http";
import type { AddressInfo } from "node:net";
import pino from "pino";
import { type DemoAccount, demoAccounts } from "#oidc-fake/accounts.ts";
import { generateSigningKey } from "#oidc-fake/provider.ts";
import { type OidcFake, startOidcFake } from "#oidc-fake/server.ts";
import { createApp } from "#server/app.ts";
import { type Database, openDatabase } from "#server/db/client.ts";
import { readSettings } from "#server/env.ts";
import { BrowserJar } from "./browser-jar.ts";
import { createTestDatabase } from "./database.ts";

export const clientId = "tempermark";
export const clientSecret = "a-client-secret-for-tests";

async function listen(server: http.Server, port = 0): Promise<number> {
  await new Promise<void>((resolve, reject) => server.once("error", reject).listen(port, "127.0.0.1", resolve));
  return (server.address() as AddressInfo).port;
}

/** The application on a port of its own with the stand-in provider (or any other issuer) beside it. */
export async function startSite(options: { issuer?: string; accounts?: readonly DemoAccount[] } = {}) {
  const database = await createTestDatabase();
  const [web, owner]: Database[] = [openDatabase(database.webUrl), openDatabase(database.ownerUrl)];
  const server = http.createServer();
  const origin = `http://127.0.0.1:${await listen(server)}`;
  const key = await generateSigningKey();
  const startProvider = (port: number) =>
    startOidcFake({
      port,
      clientId,
      clientSecret,
      redirectUris: [`${origin}/auth/callback`],
      postLogoutUris: [`${origin}/`],
      accounts: options.accounts ?? demoAccounts,
      signingKey: key,
    });
  let provider: OidcFake | undefined = options.issuer ? undefined : await startProvider(0);
  const issuer = options.issuer ?? provider!.issuer;
  const settings = readSettings({
    NODE_ENV: "test",
    PUBLIC_URL: origin,
    DATABASE_URL: database.webUrl,
    SESSION_SECRET: "a-secret-for-tests-only-0123456789",
    OIDC_ISSUER: issuer,
    OIDC_CLIENT_ID: clientId,
    OIDC_CLIENT_SECRET: clientSecret,
    OIDC_PROVIDER_NAME: "demo",
    RATE_LIMIT_PER_MINUTE: "100000",
    TRUST_PROXY: "1",
    LOG_LEVEL: "silent",
  });
  server.on("request", createApp(settings, web!, pino({ level: "silent" })));

  return {
    origin,
    issuer,
    owner: owner!,
    stopProvider: async () => provider?.stop(),
    restartProvider: async () => {
      provider = await startProvider(Number(new URL(issuer).port));
    },
    stop: async () => {
      server.close();
      server.closeAllConnections();
      await provider?.stop();
      await web!.close();
      await owner!.close();
      await database.drop();
    },
  };
}
export type Site = Awaited<ReturnType<typeof startSite>>;

/** Goes from the sign-in link to the provider's chooser and returns the chooser's address. */
export async function openChooser(site: Site, jar: BrowserJar, returnTo?: string): Promise<string> {
  const query = returnTo === undefined ? "" : `?${new URLSearchParams({ returnTo })}`;
  const { url, answer } = await jar.follow(`${site.origin}/auth/sign-in${query}`);
  if (answer.status !== 200 || !url.includes("/sign-in/")) throw new Error(`no chooser at ${url}: ${answer.status}`);
  return url;
}

/** Chooses an account (none: cancels) and stops before the application's callback, whose address it returns. */
export async function chooseAccount(site: Site, jar: BrowserJar, chooser: string, sub: string): Promise<string> {
  const init = { method: "POST", body: new URLSearchParams({ sub }) };
  const { url } = await jar.follow(chooser, (next) => next.startsWith(`${site.origin}/auth/callback`), init);
  return url;
}

/** The whole way. Returns where on the site it ended. */
export async function signInAs(site: Site, jar: BrowserJar, sub: string, returnTo?: string): Promise<string> {
  const callback = await chooseAccount(site, jar, await openChooser(site, jar, returnTo), sub);
  const answer = await jar.fetch(callback);
  return answer.headers.get("location") ?? "";
}

export async function readSession(site: Site, jar = new BrowserJar()) {
  return (await jar.fetch(`${site.origin}/api/session`)).json();
}

export const sessionCookie = (site: Site, jar: BrowserJar) => jar.cookiesOf(site.origin).get("tempermark.session");
