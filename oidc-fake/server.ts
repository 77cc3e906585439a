import http from "node:http";
import type { AddressInfo } from "node:net";
import type { JWK } from "jose";
import type Provider from "oidc-provider";
import { type DemoAccount, demoAccounts } from "./accounts.ts";
import { chooserPage, problemPage, styleSheet } from "./page.ts";
import { type Client, createProvider, generateSigningKey } from "./provider.ts";

export interface OidcFakeOptions extends Client {
  /** On 127.0.0.1; 0 for any free one. */
  port: number;
  accounts?: readonly DemoAccount[];
  /** Private RSA key that signs the tokens; a new one is made when left out. */
  signingKey?: JWK;
}

export interface OidcFake {
  issuer: string;
  stop: () => Promise<void>;
}

function setHeaders(response: http.ServerResponse, client: Client): void {
  // Choosing an account is a form that ends, by redirects, at the application: its origin must be allowed.
  const origins = [...client.redirectUris, ...client.postLogoutUris].map((uri) => new URL(uri).origin);
  const formTargets = [...new Set(["'self'", ...origins])].join(" ");
  response.setHeader(
    "content-security-policy",
    `default-src 'none'; style-src 'self'; form-action ${formTargets}; base-uri 'none'; frame-ancestors 'none'`,
  );
  response.setHeader("x-content-type-options", "nosniff");
  response.setHeader("x-frame-options", "DENY");
  response.setHeader("referrer-policy", "no-referrer");
  response.setHeader("cache-control", "no-store");
}

function send(response: http.ServerResponse, status: number, type: string, body: string): void {
  response.writeHead(status, { "content-type": `${type}; charset=utf-8` }).end(body);
}

async function readForm(request: http.IncomingMessage): Promise<URLSearchParams> {
  let body = "";
  for await (const chunk of request) {
    body += chunk;
    if (body.length > 1024) throw new Error("the form is too long");
  }
  return new URLSearchParams(body);
}

/** Changing from one person to another would need the provider's own page with a script: forget the first beforehand. */
async function forgetPerson(provider: Provider, sessionUid: string | undefined): Promise<void> {
  const session = sessionUid ? await provider.Session.findByUid(sessionUid) : undefined;
  if (!session) return;
  session.accountId = undefined;
  session.authorizations = {};
  await session.persist();
}

/** The chooser: shown on GET, answered by POST. */
async function interact(
  provider: Provider,
  accounts: readonly DemoAccount[],
  request: http.IncomingMessage,
  response: http.ServerResponse,
): Promise<void> {
  try {
    const { session } = await provider.interactionDetails(request, response);
    if (request.method !== "POST") return send(response, 200, "text/html", chooserPage(accounts));
    const sub = (await readForm(request)).get("sub");
    const known = accounts.find((account) => account.sub === sub);
    const result = known
      ? { login: { accountId: known.sub } }
      : { error: "access_denied", error_description: "Sign-in was cancelled" };
    const next = await provider.interactionResult(request, response, result, { mergeWithLastSubmission: false });
    if (known && session?.accountId !== known.sub) await forgetPerson(provider, session?.uid);
    response.writeHead(303, { location: next }).end();
  } catch (error) {
    send(response, 400, "text/html", problemPage("This sign-in has ended", (error as Error).message));
  }
}

function listen(server: http.Server, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => resolve((server.address() as AddressInfo).port));
  });
}

/** A complete OpenID Connect provider on loopback, with invented people and no passwords. */
export async function startOidcFake(options: OidcFakeOptions): Promise<OidcFake> {
  if (process.env.NODE_ENV === "production") throw new Error("the stand-in sign-in provider never runs in production");
  const accounts = options.accounts ?? demoAccounts;
  const key = options.signingKey ?? (await generateSigningKey());
  const server = http.createServer();
  const port = await listen(server, options.port);
  const host = `127.0.0.1:${port}`;
  const issuer = `http://${host}`;
  const provider = createProvider(issuer, options, accounts, key);
  provider.on("server_error", (_ctx, error) => console.error("stand-in provider:", error));
  const answer = provider.callback();

  server.on("request", (request, response) => {
    setHeaders(response, options);
    // One spelling of the address only: cookies would not be found under another, and no other site may use it.
    if (request.headers.host !== host) return send(response, 421, "text/plain", `Use ${issuer}`);
    const { pathname } = new URL(request.url ?? "/", issuer);
    if (pathname === "/favicon.ico") return response.writeHead(204).end();
    if (pathname === "/stand-in.css") return send(response, 200, "text/css", styleSheet);
    if (/^\/sign-in\/[\w-]+$/.test(pathname)) return interact(provider, accounts, request, response);
    return answer(request, response);
  });

  const stop = () =>
    new Promise<void>((resolve) => {
      server.close(() => resolve());
      server.closeIdleConnections();
      setTimeout(() => server.closeAllConnections(), 1000).unref();
    });
  return { issuer, stop };
}
