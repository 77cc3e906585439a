import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { captureLog } from "../../support/captured-log.ts";
import { makeStaffedShop } from "../../support/factories.ts";
import { startPlainIssuer } from "../../support/plain-issuer.ts";

const log = captureLog();
let api: TestApi;
beforeAll(async () => {
  api = await createTestApi({ RATE_LIMIT_PER_MINUTE: "12", TRUST_PROXY: "1" }, log.logger);
});
afterAll(() => api.close());

let addresses = 0;
const newAddress = () => `203.0.113.${++addresses}`;

test("every answer carries an id of its own and headers that let no foreign script in", async () => {
  const client = await api.as();
  const address = newAddress();
  const [one, two] = [
    await client.get("/api/session").set("X-Forwarded-For", address),
    await client.get("/nowhere").set("X-Forwarded-For", address),
  ];
  expect(one.headers["x-request-id"]).toMatch(/^[0-9a-f-]{36}$/);
  expect(two.headers["x-request-id"]).not.toBe(one.headers["x-request-id"]);
  for (const { headers } of [one, two]) {
    const policy = headers["content-security-policy"];
    expect(policy).toContain("script-src 'self'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/unsafe|\*|http:/);
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers["x-powered-by"]).toBeUndefined();
    expect(headers["strict-transport-security"]).toBeUndefined(); // plain http on loopback
  }
});

test("over https the browser is told to stay there, and the cookie goes nowhere else", async () => {
  const issuer = await startPlainIssuer();
  const secure = await createTestApi({
    PUBLIC_URL: "https://tempermark.example",
    TRUST_PROXY: "1",
    OIDC_ISSUER: issuer.issuer,
  });
  const answer = await (await secure.as()).get("/api/session");
  expect(answer.headers["strict-transport-security"]).toBe("max-age=31536000; includeSubDomains");
  expect(answer.headers["content-security-policy"]).toContain("upgrade-insecure-requests");
  const begun = await (await secure.as()).get("/auth/sign-in").set("X-Forwarded-Proto", "https").expect(302);
  expect(begun.headers["set-cookie"]?.[0]).toMatch(/; HttpOnly; Secure; SameSite=Lax$/);
  await secure.close();
  await issuer.stop();
});

test("a caller over the limit waits, and is told how long; another caller does not", async () => {
  const client = await api.as();
  const [busy, calm] = [newAddress(), newAddress()];
  const ask = (address: string) => client.get("/api/session").set("X-Forwarded-For", address);
  for (let count = 0; count < 12; count += 1) expect((await ask(busy)).status).toBe(200);
  const refused = await ask(busy);
  expect([refused.status, refused.body.type]).toEqual([429, "/problems/too-many-requests"]);
  expect(Number(refused.headers["retry-after"])).toBeGreaterThan(0);
  expect(Number(refused.headers["retry-after"])).toBeLessThanOrEqual(60);
  expect(refused.headers.ratelimit).toMatch(/r=0; t=\d+/);
  expect(refused.headers["ratelimit-policy"]).toMatch(/q=12; w=60/);
  expect((await ask(calm)).status).toBe(200);
});

test("somebody signed in is counted by account, wherever they ask from", async () => {
  const { boss, operator } = await makeStaffedShop(api.owner);
  const client = await api.as(boss.id);
  for (let count = 0; count < 12; count += 1) {
    expect((await client.get("/api/session").set("X-Forwarded-For", newAddress())).status).toBe(200);
  }
  expect((await client.get("/api/session").set("X-Forwarded-For", newAddress())).status).toBe(429);
  await (await api.as(operator.id)).get("/api/session").expect(200);
});

test("one address sends ten applications a minute, no more", async () => {
  const client = await api.as();
  const address = newAddress();
  const send = () => client.post("/api/applications").set("X-Forwarded-For", address).send({});
  for (let count = 0; count < 10; count += 1) expect((await send()).status).toBe(400);
  expect((await send()).status).toBe(429);
});

test("no address is stored with the counts", async () => {
  const { rows } = await api.owner.pool.query("select caller from rate_limits");
  expect(rows.length).toBeGreaterThan(0);
  for (const { caller } of rows) expect(caller).toMatch(/^(api|auth|applications):[\w-]{22,36}$/);
});

test("the log says what was asked and how it went, and nothing of who", async () => {
  const { boss } = await makeStaffedShop(api.owner);
  const address = newAddress();
  const application = {
    shopName: "Loggable Shop",
    place: "Logham",
    contactName: "Ada Loggable",
    email: "ada@loggable.example",
    machines: 1,
    about: "Secret things I cut, told in confidence.",
  };
  const visitor = await api.as();
  await visitor.post("/api/applications").set("X-Forwarded-For", address).send(application).expect(201);
  await visitor.get("/auth/callback?code=secret-code&state=secret-state").set("X-Forwarded-For", address).expect(302);
  await (await api.as(boss.id)).get("/api/machines?search=secret-search").set("User-Agent", "secret-agent").expect(200);
  const broken = '{"contactName": "Ada Loggable"';
  await visitor.post("/api/applications").set("X-Forwarded-For", address).type("json").send(broken).expect(400);
  expect(log.entries()).toContainEqual(
    expect.objectContaining({
      req: { id: expect.any(String), method: "POST", path: "/api/applications" },
      res: { status: 201 },
      responseTime: expect.any(Number),
    }),
  );
  const text = log.text();
  for (const personal of ["oggable", "Logham", "confidence", address, boss.email, boss.name, boss.id, "secret"]) {
    expect(text).not.toContain(personal);
  }
});

test("what PostgreSQL says of a value it cannot read stays out of the log", async () => {
  await api.owner.pool.query("alter table machines alter note drop default, alter note type int using 0");
  const { boss } = await makeStaffedShop(api.owner);
  const machine = {
    name: "T",
    powerSourceMaxCurrentA: 65,
    startMethod: "contact",
    torchPressureBar: 5,
    dryness: "refrigerated",
  };
  const answer = await (await api.as(boss.id)).post("/api/machines").send({
    ...machine,
    heightControl: "none",
    heightControlSampleHz: null,
    topFeedMmMin: 9000,
    note: "ada@private.example",
  });
  expect([answer.status, answer.body.type]).toEqual([500, "/problems/internal"]);
  expect(JSON.stringify(answer.body)).not.toMatch(/integer|note|sql/i);
  expect(log.text()).toContain("PostgreSQL refused a value (22P02)");
  expect(log.text()).not.toContain("private.example");
});
