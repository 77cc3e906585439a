import { afterAll, beforeAll, expect, test } from "vitest";
import { demoAccounts } from "#oidc-fake/accounts.ts";
import { BrowserJar } from "#tests/support/browser-jar.ts";
import { makeAdmin, makeShop, makeUser } from "#tests/support/factories.ts";
import {
  chooseAccount,
  openChooser,
  readSession,
  type Site,
  sessionCookie,
  signInAs,
  startSite,
} from "#tests/support/sign-in-site.ts";

let site: Site;
beforeAll(async () => {
  site = await startSite();
});
afterAll(() => site.stop());

const post = (jar: BrowserJar, path: string) =>
  jar.fetch(`${site.origin}${path}`, { method: "POST", headers: { origin: site.origin } });

const findSession = async (cookie: string | undefined) => {
  const sid = decodeURIComponent(cookie ?? "")
    .slice(2)
    .split(".")[0];
  return (await site.owner.pool.query("select sess from sessions where sid = $1", [sid])).rows[0]?.sess;
};

test.each(demoAccounts.map(({ sub, name, email }) => [sub, name, email]))(
  "%s signs in and is who the provider says",
  async (sub, name, email) => {
    const jar = new BrowserJar();
    expect(await signInAs(site, jar, sub)).toBe("/");
    expect(await readSession(site, jar)).toMatchObject({ user: { name, email }, shop: null, admin: false });
  },
);

test("signing in again finds the same person", async () => {
  const [first, second] = [new BrowserJar(), new BrowserJar()];
  await signInAs(site, first, "demo-visitor");
  await signInAs(site, second, "demo-visitor");
  expect((await readSession(site, second)).user.id).toBe((await readSession(site, first)).user.id);
});

test("two first sign-ins of one person at once make one person", async () => {
  await site.owner.pool.query("delete from users where email = 'owner@fernlatch.example'");
  const jars = [new BrowserJar(), new BrowserJar()];
  const ends = await Promise.all(jars.map((jar) => signInAs(site, jar, "demo-new-owner")));
  expect(ends).toEqual(["/", "/"]);
  const [first, second] = await Promise.all(jars.map((jar) => readSession(site, jar)));
  expect(first.user.id).toBe(second.user.id);
});

test("the first sign-in of an admitted applicant makes them owner, and the invitation is used up", async () => {
  const shop = await makeShop(site.owner, { name: "Osterhollow Fabrication" });
  await site.owner.pool.query(
    "insert into invitations (shop_id, email, role) values ($1, 'owner@osterhollow.example', 'owner')",
    [shop.id],
  );
  const jar = new BrowserJar();
  await signInAs(site, jar, "demo-applicant");
  expect((await readSession(site, jar)).shop).toEqual({ id: shop.id, name: shop.name, state: "active", role: "owner" });
  const { rows } = await site.owner.pool.query("select accepted_at from invitations where shop_id = $1", [shop.id]);
  expect(rows[0].accepted_at).not.toBeNull();
});

test("an account prepared for an address is taken by whoever proves the address", async () => {
  await site.owner.pool.query("delete from users where email = 'gus@tempermark.example'");
  const prepared = await makeUser(site.owner, { email: "gus@tempermark.example", provider: null, subject: null });
  await site.owner.pool.query("insert into network_admins values ($1)", [prepared.id]);
  const jar = new BrowserJar();
  await signInAs(site, jar, "demo-second-admin");
  expect(await readSession(site, jar)).toMatchObject({ user: { id: prepared.id }, admin: true });
});

test("a forged, a missing and another browser's state are refused", async () => {
  const jar = new BrowserJar();
  const callback = new URL(await chooseAccount(site, jar, await openChooser(site, jar), "demo-owner"));
  const elsewhere = await new BrowserJar().fetch(callback.href);
  expect(elsewhere.headers.get("location")).toBe("/?sign-in=expired");
  for (const state of ["forged", ""]) {
    const wrong = new URL(callback);
    wrong.searchParams.set("state", state);
    expect((await jar.fetch(wrong.href)).headers.get("location")).toBe("/?sign-in=expired");
  }
  expect((await readSession(site, jar)).user).toBeNull();
});

test("a callback works once: neither its state nor its code is good again", async () => {
  const jar = new BrowserJar();
  const callback = await chooseAccount(site, jar, await openChooser(site, jar), "demo-owner");
  expect((await jar.fetch(callback)).headers.get("location")).toBe("/");
  await post(jar, "/api/sign-out");
  expect((await jar.fetch(callback)).headers.get("location")).toBe("/?sign-in=expired");
  // The code again under a state of another sign-in in the same browser: the provider knows whose code it was.
  const fresh = new URL(await chooseAccount(site, jar, await openChooser(site, jar), "demo-owner"));
  fresh.searchParams.set("code", new URL(callback).searchParams.get("code")!);
  expect((await jar.fetch(fresh.href)).headers.get("location")).toBe("/?sign-in=failed");
  expect((await readSession(site, jar)).user).toBeNull();
});

test("another's code is no use in one's own browser: the verifier is missing", async () => {
  const [thief, victim] = [new BrowserJar(), new BrowserJar()];
  const stolen = new URL(await chooseAccount(site, victim, await openChooser(site, victim), "demo-owner"));
  const own = new URL(await chooseAccount(site, thief, await openChooser(site, thief), "demo-visitor"));
  own.searchParams.set("code", stolen.searchParams.get("code")!);
  expect((await thief.fetch(own.href)).headers.get("location")).toBe("/?sign-in=failed");
  expect((await readSession(site, thief)).user).toBeNull();
});

test("cancelling at the provider leads back to the start page, signed out", async () => {
  const jar = new BrowserJar();
  expect(await signInAs(site, jar, "")).toBe("/?sign-in=cancelled");
  expect((await readSession(site, jar)).user).toBeNull();
});

test("beginning and finishing are not mixed up by what is put into the address", async () => {
  for (const path of ["/auth/sign-in?code=x&state=y", "/auth/sign-in?error=access_denied", "/auth/callback"]) {
    const answer = await new BrowserJar().fetch(`${site.origin}${path}`);
    expect([answer.status, answer.headers.get("location")]).toEqual([302, "/?sign-in=failed"]);
  }
});

test.each(["/recipes/new?material=brass", "/peers#strip"])("comes back to %s", async (returnTo) => {
  expect(await signInAs(site, new BrowserJar(), "demo-visitor", returnTo)).toBe(returnTo);
});

test.each([
  "https://evil.example/",
  "//evil.example/",
  "/\\evil.example",
  "\\\\evil.example",
  "/\t/evil.example",
  "javascript:alert(1)",
  "/%0d%0aSet-Cookie:x=y\r\nX: y",
  "",
])("never leads away to %j", async (returnTo) => {
  expect(await signInAs(site, new BrowserJar(), "demo-visitor", returnTo)).toBe("/");
});

test("the session has a new id after signing in, and the old one is worth nothing", async () => {
  const jar = new BrowserJar();
  const callback = await chooseAccount(site, jar, await openChooser(site, jar), "demo-visitor");
  const planted = sessionCookie(site, jar);
  await jar.fetch(callback);
  expect(sessionCookie(site, jar)).not.toBe(planted);
  expect(await findSession(planted)).toBeUndefined();
  const attacker = new BrowserJar();
  attacker.cookiesOf(site.origin).set("tempermark.session", planted!);
  expect((await readSession(site, attacker)).user).toBeNull();
});

test("the cookie is out of reach of scripts and other sites, and a changed one is nobody's", async () => {
  const jar = new BrowserJar();
  const callback = await chooseAccount(site, jar, await openChooser(site, jar), "demo-visitor");
  const [line = ""] = (await jar.fetch(callback)).headers.getSetCookie();
  expect(line).toMatch(/^tempermark\.session=.*; Path=\/; Expires=.*; HttpOnly; SameSite=Lax$/);
  const cookie = sessionCookie(site, jar)!;
  jar.cookiesOf(site.origin).set("tempermark.session", `${cookie.slice(0, -1)}${cookie.endsWith("A") ? "B" : "A"}`);
  expect((await readSession(site, jar)).user).toBeNull();
});

test("signing out ends the session here and at the provider, and the old cookie is dead", async () => {
  const jar = new BrowserJar();
  await signInAs(site, jar, "demo-owner");
  const cookie = sessionCookie(site, jar)!;
  const { continueAt } = await (await post(jar, "/api/sign-out")).json();
  expect(await findSession(cookie)).toBeUndefined();
  jar.cookiesOf(site.origin).set("tempermark.session", cookie);
  expect((await readSession(site, jar)).user).toBeNull();

  expect(continueAt.startsWith(site.issuer)).toBe(true);
  const page = await jar.fetch(continueAt);
  expect(page.status).toBe(200);
  const xsrf = /name="xsrf" value="([^"]+)"/.exec(await page.text())?.[1] ?? "";
  const body = new URLSearchParams({ xsrf, logout: "yes" });
  const init = { method: "POST", body };
  const { url } = await jar.follow(`${site.issuer}/session/end/confirm`, (next) => next.startsWith(site.origin), init);
  expect(url).toBe(`${site.origin}/`);
});

test("two tabs sign in side by side, each back to its own place or simply in", async () => {
  const jar = new BrowserJar();
  const [one, two] = [await openChooser(site, jar, "/one"), await openChooser(site, jar, "/two")];
  expect((await jar.fetch(await chooseAccount(site, jar, two, "demo-visitor"))).headers.get("location")).toBe("/two");
  const cookie = sessionCookie(site, jar);
  expect((await jar.fetch(await chooseAccount(site, jar, one, "demo-visitor"))).headers.get("location")).toBe("/");
  expect(sessionCookie(site, jar)?.split(".")[0]).toBe(cookie?.split(".")[0]);
  expect((await readSession(site, jar)).user.email).toBe("pip@wanderlea.example");
});

test("a later tab does not use up the sign-in an earlier one began", async () => {
  const jar = new BrowserJar();
  const earlier = await chooseAccount(site, jar, await openChooser(site, jar, "/earlier"), "demo-visitor");
  await openChooser(site, jar, "/later");
  expect((await jar.fetch(earlier)).headers.get("location")).toBe("/earlier");
});

test("suspension ends the sessions of a shop at once", async () => {
  const jar = new BrowserJar();
  await signInAs(site, jar, "demo-operator");
  const { user } = await readSession(site, jar);
  const shop = await makeShop(site.owner);
  await site.owner.pool.query("insert into memberships values ($1, $2, 'operator')", [user.id, shop.id]);
  const adminJar = new BrowserJar();
  await signInAs(site, adminJar, "demo-admin");
  const admin = await readSession(site, adminJar);
  await site.owner.pool.query("insert into network_admins values ($1)", [admin.user.id]);
  expect((await jar.fetch(`${site.origin}/api/machines`)).status).toBe(200);
  const answer = await adminJar.fetch(`${site.origin}/api/members/${shop.id}/suspension`, {
    method: "POST",
    headers: { origin: site.origin, "content-type": "application/json" },
    body: JSON.stringify({ reason: "Under review." }),
  });
  expect(answer.status).toBe(200);
  expect((await jar.fetch(`${site.origin}/api/machines`)).status).toBe(401);
  await signInAs(site, jar, "demo-operator");
  expect((await readSession(site, jar)).shop.state).toBe("suspended");
  expect((await jar.fetch(`${site.origin}/api/machines`)).status).toBe(403);
});

test("an address in use by another identity lets nobody in", async () => {
  await site.owner.pool.query("delete from users where email = 'owner@quillmoor.example'");
  await makeUser(site.owner, { email: "owner@quillmoor.example", provider: "demo", subject: "an-older-account" });
  const jar = new BrowserJar();
  expect(await signInAs(site, jar, "demo-suspended-owner")).toBe("/?sign-in=address-in-use");
  expect((await readSession(site, jar)).user).toBeNull();
});

test("while the provider is down nobody waits or breaks, and signing in works again when it is back", async () => {
  const other = await startSite();
  await makeAdmin(other.owner);
  const begun = new BrowserJar();
  await other.stopProvider();
  const down = await begun.fetch(`${other.origin}/auth/sign-in`);
  expect([down.status, down.headers.get("location")]).toEqual([302, "/?sign-in=unavailable"]);
  await other.restartProvider();
  const callback = await chooseAccount(other, begun, await openChooser(other, begun), "demo-visitor");
  await other.stopProvider();
  expect((await begun.fetch(callback)).headers.get("location")).toBe("/?sign-in=unavailable");
  await other.restartProvider();
  expect(await signInAs(other, begun, "demo-visitor")).toBe("/");
  await other.stop();
});
