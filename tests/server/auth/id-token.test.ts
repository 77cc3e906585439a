import { randomUUID } from "node:crypto";
import { generateKeyPair, type JWTPayload } from "jose";
import { afterAll, beforeAll, expect, test } from "vitest";
import { BrowserJar } from "#tests/support/browser-jar.ts";
import { makeShop } from "#tests/support/factories.ts";
import { startPlainIssuer } from "#tests/support/plain-issuer.ts";
import { clientSecret, readSession, type Site, startSite } from "#tests/support/sign-in-site.ts";

let issuer: Awaited<ReturnType<typeof startPlainIssuer>>;
let site: Site;
beforeAll(async () => {
  issuer = await startPlainIssuer();
  site = await startSite({ issuer: issuer.issuer });
});
afterAll(async () => {
  await site.stop();
  await issuer.stop();
});

type MakeToken = (right: JWTPayload) => string | Promise<string>;

/** Signs in with the token `make` gives for this sign-in's right claims. Returns where it ended. */
async function signInWith(jar: BrowserJar, make: MakeToken): Promise<string> {
  const begun = await jar.fetch(`${site.origin}/auth/sign-in`);
  const asked = new URL(begun.headers.get("location")!).searchParams;
  const sub = randomUUID();
  const email = `${sub.slice(0, 8)}@person.example`;
  issuer.answerWith(await make({ sub, email, email_verified: true, name: "Some Body", nonce: asked.get("nonce")! }));
  const answer = await jar.fetch(`${site.origin}/auth/callback?code=c&state=${asked.get("state")}`);
  return answer.headers.get("location") ?? "";
}

const encode = (part: object) => Buffer.from(JSON.stringify(part)).toString("base64url");

test("a right token signs in", async () => {
  const jar = new BrowserJar();
  expect(await signInWith(jar, (right) => issuer.sign(right))).toBe("/");
  expect((await readSession(site, jar)).user.name).toBe("Some Body");
});

test("each sign-in asks with a state, a nonce and an S256 challenge of its own", async () => {
  const ask = async () =>
    new URL((await new BrowserJar().fetch(`${site.origin}/auth/sign-in`)).headers.get("location")!).searchParams;
  const [one, two] = [await ask(), await ask()];
  expect(one.get("code_challenge_method")).toBe("S256");
  expect(one.get("response_type")).toBe("code");
  for (const name of ["state", "nonce", "code_challenge"]) {
    expect(one.get(name)).toMatch(/^[\w-]{43}$/);
    expect(one.get(name)).not.toBe(two.get(name));
  }
});

const wrong: Record<string, MakeToken> = {
  "another nonce": (right) => issuer.sign({ ...right, nonce: "another" }),
  "no nonce": ({ nonce: _, ...right }) => issuer.sign(right),
  "another audience": (right) => issuer.sign({ ...right, aud: "another-client" }),
  "another issuer": (right) => issuer.sign({ ...right, iss: "https://elsewhere.example" }),
  "a time that has passed": (right) => issuer.sign({ ...right, iat: 1, exp: 1000 }),
  "no address": ({ email: _, ...right }) => issuer.sign(right),
  "a subject too long to be one": (right) => issuer.sign({ ...right, sub: "s".repeat(256) }),
  "another's signature": async (right) => issuer.sign(right, (await generateKeyPair("RS256")).privateKey),
  "a signature by the shared secret": (right) => issuer.sign(right, new TextEncoder().encode(clientSecret), "HS256"),
  "claims changed after signing": async (right) => {
    const [head, , signature] = (await issuer.sign(right)).split(".");
    const now = Math.floor(Date.now() / 1000);
    const changed = { iss: issuer.issuer, aud: "tempermark", iat: now, exp: now + 300, ...right, sub: "admin" };
    return `${head}.${encode(changed)}.${signature}`;
  },
  "no signature at all": (right) => {
    const now = Math.floor(Date.now() / 1000);
    const claims = { iss: issuer.issuer, aud: "tempermark", iat: now, exp: now + 300, ...right };
    return `${encode({ alg: "none" })}.${encode(claims)}.`;
  },
  "no token in it": () => "",
  "something that is no token": () => "a.b.c",
};

test.each(Object.keys(wrong))("a token with %s lets nobody in", async (name) => {
  const jar = new BrowserJar();
  expect(await signInWith(jar, wrong[name]!)).toMatch(/^\/\?sign-in=(failed|expired)$/);
  expect((await readSession(site, jar)).user).toBeNull();
});

test("roles come from our own tables, whatever the provider claims", async () => {
  const jar = new BrowserJar();
  const claims = { admin: true, role: "owner", roles: ["admin"], groups: ["network_admins"], shop_id: randomUUID() };
  await signInWith(jar, (right) => issuer.sign({ ...right, ...claims }));
  expect(await readSession(site, jar)).toMatchObject({ admin: false, shop: null });
  expect((await jar.fetch(`${site.origin}/api/members`)).status).toBe(403);
});

test.each([false, undefined])("an address the provider calls verified: %s opens nothing", async (verified) => {
  const email = `${randomUUID().slice(0, 8)}@invited.example`;
  const shop = await makeShop(site.owner);
  await site.owner.pool.query("insert into invitations (shop_id, email, role) values ($1, $2, 'owner')", [
    shop.id,
    email,
  ]);
  const jar = new BrowserJar();
  const end = await signInWith(jar, ({ email_verified: _, ...right }) =>
    issuer.sign({ ...right, email, ...(verified === undefined ? {} : { email_verified: verified }) }),
  );
  expect(end).toBe("/?sign-in=unverified");
  expect((await readSession(site, jar)).user).toBeNull();
  const made = await site.owner.pool.query("select 1 from users where email = $1", [email]);
  expect(made.rowCount).toBe(0);
});

test("somebody known keeps signing in when their address is no longer verified, and gains nothing by it", async () => {
  const sub = randomUUID();
  const email = `${sub.slice(0, 8)}@person.example`;
  await signInWith(new BrowserJar(), (right) => issuer.sign({ ...right, sub, email }));
  const victim = `${randomUUID().slice(0, 8)}@invited.example`;
  const shop = await makeShop(site.owner);
  await site.owner.pool.query("insert into invitations (shop_id, email, role) values ($1, $2, 'owner')", [
    shop.id,
    victim,
  ]);
  const jar = new BrowserJar();
  const end = await signInWith(jar, (right) => issuer.sign({ ...right, sub, email: victim, email_verified: false }));
  expect(end).toBe("/");
  expect(await readSession(site, jar)).toMatchObject({ user: { email }, shop: null });
});

test("an address is matched in any case", async () => {
  const email = `${randomUUID().slice(0, 8)}@invited.example`;
  const shop = await makeShop(site.owner);
  await site.owner.pool.query("insert into invitations (shop_id, email, role) values ($1, $2, 'operator')", [
    shop.id,
    email,
  ]);
  const jar = new BrowserJar();
  await signInWith(jar, (right) => issuer.sign({ ...right, email: email.toUpperCase() }));
  expect((await readSession(site, jar)).shop).toMatchObject({ id: shop.id, role: "operator" });
});
