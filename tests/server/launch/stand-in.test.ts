import { createHash } from "node:crypto";
import { request } from "node:http";
import { createRemoteJWKSet, decodeJwt, jwtVerify } from "jose";
import { afterAll, beforeEach, expect, test } from "vitest";
import { demoAccounts } from "#oidc-fake/accounts.ts";
import { chooserPage, problemPage } from "#oidc-fake/page.ts";
import { startOidcFake } from "#oidc-fake/server.ts";

const home = "http://127.0.0.1:9";
const callback = `${home}/auth/callback`;
const clientSecret = "secret-of-the-stand-in-test";
const verifier = "a-verifier-of-forty-three-characters-or-more-0123";
const challenge = createHash("sha256").update(verifier).digest("base64url");

const provider = await startOidcFake({
  port: 0,
  clientId: "test",
  clientSecret,
  redirectUris: [callback],
  postLogoutUris: [`${home}/`],
});
afterAll(() => provider.stop());

/** A browser's cookies; each test begins with none. */
let cookies = new Map<string, string>();
beforeEach(() => {
  cookies = new Map();
});

async function visit(target: string, form?: Record<string, string>): Promise<Response> {
  const cookie = [...cookies].map(([name, value]) => `${name}=${value}`).join("; ");
  const body = form ? { method: "POST", body: new URLSearchParams(form) } : {};
  const response = await fetch(new URL(target, provider.issuer), { redirect: "manual", headers: { cookie }, ...body });
  for (const line of response.headers.getSetCookie()) {
    const [, name, value] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
    if (name) cookies.set(name, value ?? "");
  }
  return response;
}

const goesTo = (response: Response) => response.headers.get("location") ?? "";

function authorization(
  extra: Record<string, string> = { code_challenge: challenge, code_challenge_method: "S256" },
): string {
  const query = { client_id: "test", response_type: "code", redirect_uri: callback, scope: "openid email profile" };
  return `/auth?${new URLSearchParams({ ...query, state: "the-state", nonce: "the-nonce", ...extra })}`;
}

/** Goes from the application to the chooser, takes an account and returns to the application. */
async function chooseAccount(sub: string): Promise<URL> {
  const chooser = goesTo(await visit(authorization()));
  expect(chooser).toMatch(/^\/sign-in\//);
  return new URL(goesTo(await visit(goesTo(await visit(chooser, { sub })))));
}

const exchange = (code: string, codeVerifier = verifier, secret = clientSecret) =>
  visit("/token", {
    grant_type: "authorization_code",
    code,
    redirect_uri: callback,
    client_id: "test",
    client_secret: secret,
    code_verifier: codeVerifier,
  });

async function signIn(sub: string): Promise<string> {
  const code = (await chooseAccount(sub)).searchParams.get("code") ?? "";
  const { id_token: idToken } = (await (await exchange(code)).json()) as { id_token: string };
  return idToken;
}

test.each(demoAccounts)("signs in $sub with a token that proves name and e-mail", async ({ sub, name, email }) => {
  const keys = createRemoteJWKSet(new URL("/jwks", provider.issuer));
  const { payload } = await jwtVerify(await signIn(sub), keys, { issuer: provider.issuer, audience: "test" });
  expect(payload).toMatchObject({ sub, name, email, email_verified: true, nonce: "the-nonce" });
});

test("asks again who it is to be, although somebody is signed in", async () => {
  for (const sub of ["demo-owner", "demo-admin", "demo-admin", "demo-owner"]) {
    expect(decodeJwt(await signIn(sub)).sub).toBe(sub);
  }
});

test.each([[""], ["demo-nobody"]])("an account %j is a cancelled sign-in", async (sub) => {
  const returned = await chooseAccount(sub);
  expect(returned.searchParams.get("error")).toBe("access_denied");
  expect(returned.searchParams.get("state")).toBe("the-state");
});

test("refuses a sign-in without PKCE", async () => {
  const returned = new URL(goesTo(await visit(authorization({}))));
  expect(returned.searchParams.get("error")).toBe("invalid_request");
});

test.each([
  ["a wrong verifier", "another-verifier-of-forty-three-characters-at-least", clientSecret, 400],
  ["a wrong client secret", verifier, "not-the-secret", 401],
])("refuses %s", async (_what, codeVerifier, secret, status) => {
  const code = (await chooseAccount("demo-owner")).searchParams.get("code") ?? "";
  expect((await exchange(code, codeVerifier, secret)).status).toBe(status);
});

test("a code is good once", async () => {
  const code = (await chooseAccount("demo-owner")).searchParams.get("code") ?? "";
  expect((await exchange(code)).status).toBe(200);
  expect((await exchange(code)).status).toBe(400);
});

test("returns to no address but the application's", async () => {
  const response = await visit(authorization({ redirect_uri: "http://127.0.0.1:10/auth/callback" }));
  expect(response.status).toBe(400);
  expect(await response.text()).toContain("Sign-in did not work");
});

test("signs out on a page of its own and returns to the application", async () => {
  const idToken = await signIn("demo-owner");
  const query = new URLSearchParams({ id_token_hint: idToken, post_logout_redirect_uri: `${home}/` });
  const page = await (await visit(`/session/end?${query}`)).text();
  expect(page).toContain("Sign out here too");
  const xsrf = /name="xsrf" value="([^"]+)"/.exec(page)?.[1] ?? "";
  expect(goesTo(await visit("/session/end/confirm", { xsrf, logout: "yes" }))).toBe(`${home}/`);
});

test("its pages run no script, load nothing from outside and say what they are", async () => {
  const response = await visit(goesTo(await visit(authorization())));
  const page = await response.text();
  expect(response.headers.get("content-security-policy")).toBe(
    `default-src 'none'; style-src 'self'; form-action 'self' ${home}; base-uri 'none'; frame-ancestors 'none'`,
  );
  expect(page).not.toMatch(/<script|https?:\/\/|style=/);
  expect(page).toContain("stands in for a real sign-in provider");
  const style = await visit("/stand-in.css");
  expect(style.headers.get("content-type")).toBe("text/css; charset=utf-8");
  expect(await style.text()).not.toMatch(/@import|url\(/);
});

test("writes nothing unescaped into a page", () => {
  const strange = { sub: '"><b>', name: "<i>", email: "&'", role: "<u>", shop: null };
  expect(chooserPage([strange]) + problemPage("<s>", "<em>")).not.toMatch(/<(b|i|u|s|em)>/);
});

test("answers to its one address only", async () => {
  const { port } = new URL(provider.issuer);
  const status = await new Promise((resolve) => {
    const headers = { host: `localhost:${port}` };
    request({ host: "127.0.0.1", port, path: "/.well-known/openid-configuration", headers }, (response) => {
      response.resume();
      resolve(response.statusCode);
    }).end();
  });
  expect(status).toBe(421);
});

test("a sign-in that is unknown or over is refused on a page", async () => {
  const response = await visit("/sign-in/not-a-known-one");
  expect(response.status).toBe(400);
  expect(await response.text()).toContain("This sign-in has ended");
});
