import { afterAll, beforeAll, expect, test } from "vitest";
import { Problem } from "#shared/contracts/problem.ts";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { makeStaffedShop } from "../../support/factories.ts";

let api: TestApi;
let shop: Awaited<ReturnType<typeof makeStaffedShop>>;
beforeAll(async () => {
  api = await createTestApi();
  shop = await makeStaffedShop(api.owner);
});
afterAll(() => api.close());

const boss = () => api.as(shop.boss.id);
const table = {
  name: "North table",
  powerSourceMaxCurrentA: 65,
  startMethod: "contact",
  torchPressureBar: 5.2,
  dryness: "refrigerated",
  heightControl: "none",
  heightControlSampleHz: null,
  topFeedMmMin: 10_000,
};

test("a refusal is problem+json with its type, title, status and the request's id, and is not kept", async () => {
  const answer = await (await api.as()).get("/api/machines").expect(401);
  expect(answer.headers["content-type"]).toMatch(/^application\/problem\+json/);
  expect(answer.headers["cache-control"]).toBe("no-store");
  expect(Problem.parse(answer.body)).toEqual({
    type: "/problems/not-signed-in",
    title: "Sign in first",
    status: 401,
    requestId: answer.headers["x-request-id"],
  });
});

test.each(["get", "post", "put", "patch", "delete"] as const)(
  "%s of an unknown path is a 404 problem",
  async (verb) => {
    for (const path of ["/api/nothing", "/api/machines/x/y/z", "/auth/nothing"]) {
      const answer = await (await boss())[verb](path).expect(404);
      expect(answer.body).toMatchObject({ type: "/problems/not-found", status: 404 });
    }
  },
);

test("an id that is none names nothing", async () => {
  expect((await (await boss()).get("/api/machines/1%27%20or%20true")).body.type).toBe("/problems/not-found");
  expect((await (await boss()).get("/api/machines/%E0%A4%A")).status).toBe(400);
});

test.each([
  ["broken JSON", "application/json", '{"name": '],
  ["a text for a body", "application/json", '"name"'],
  ["a list for a body", "application/json", "[]"],
  ["another charset", "application/json; charset=utf-99", "{}"],
  ["a form", "application/x-www-form-urlencoded", "name=x"],
  ["plain text", "text/plain", JSON.stringify(table)],
  ["no type", "", JSON.stringify(table)],
])("%s is 400, and says so without repeating it", async (_what, type, body) => {
  const client = await boss();
  const request = client.post("/api/machines").set("Content-Type", type);
  const answer = await request.serialize((text) => String(text)).send(body);
  expect(answer.status).toBe(400);
  expect(answer.body.type).toBe("/problems/invalid-request");
  expect(JSON.stringify(answer.body)).not.toContain("North");
});

test("an optional body of the wrong type is refused too, not taken for an empty one", async () => {
  const request = (await boss()).patch("/api/account/preferences").set("Content-Type", "text/plain");
  expect((await request.send('{"theme":"dark"}')).status).toBe(400);
});

test("a body over 256 kB is 413", async () => {
  const answer = await (await boss()).post("/api/machines").send({ ...table, note: "x".repeat(300_000) });
  expect([answer.status, answer.body.type]).toEqual([413, "/problems/too-large"]);
});

test("every wrong field has its pointer and its reason", async () => {
  const answer = await (await boss()).post("/api/machines").send({ ...table, name: " ", topFeedMmMin: "fast" });
  expect(answer.body.errors).toEqual([
    { pointer: "/name", detail: "Give the machine a name" },
    { pointer: "/topFeedMmMin", detail: expect.any(String) },
  ]);
});

test("a figure out of range is answered with the range in the member's unit", async () => {
  const wrong = { ...table, topFeedMmMin: 1, torchPressureBar: 72, powerSourceMaxCurrentA: 4000 };
  const refuse = async () => {
    const { body } = await (await boss()).post("/api/machines").send(wrong).expect(400);
    return Object.fromEntries(body.errors.map((e: { pointer: string; detail: string }) => [e.pointer, e.detail]));
  };
  expect(await refuse()).toEqual({
    "/powerSourceMaxCurrentA": "Allowed: 10 to 400 A",
    "/torchPressureBar": "Allowed: 2 to 9 bar",
    "/topFeedMmMin": "Allowed: 50 to 100,000 mm/min",
  });
  await (await boss()).patch("/api/account/preferences").send({ units: "inch" }).expect(200);
  // 9 bar is 130.53 psi and 50 mm/min is 1.969 in/min by definition of the inch and the pound: rounded inwards.
  expect(await refuse()).toEqual({
    "/powerSourceMaxCurrentA": "Allowed: 10 to 400 A",
    "/torchPressureBar": "Allowed: 29.1 to 130.5 psi",
    "/topFeedMmMin": "Allowed: 2 to 3,937 in/min",
  });
  await (await boss()).patch("/api/account/preferences").send({ units: "metric" }).expect(200);
});

test.each(["zero \u0000 character", "half a pair \ud83d"])(
  "a text that cannot be kept is refused: %j",
  async (note) => {
    const { body } = await (await boss())
      .post("/api/machines")
      .send({ ...table, note })
      .expect(400);
    expect(body.errors).toEqual([{ pointer: "/note", detail: "Contains a character that cannot be kept" }]);
  },
);

test.each(["post", "put", "patch", "delete"] as const)("%s needs the site's own origin", async (verb) => {
  const client = await boss();
  for (const origin of ["http://elsewhere.example", "null", "", "http://127.0.0.1:43000", "https://127.0.0.1:4300"]) {
    const answer = await client[verb]("/api/machines").set("Origin", origin).send({});
    expect([answer.status, answer.body.type]).toEqual([403, "/problems/origin-refused"]);
  }
});

test("reading needs no origin", async () => {
  await (await boss()).get("/api/machines").set("Origin", "http://elsewhere.example").expect(200);
});

test("a key names one request: sent again it is answered alike and done once", async () => {
  const send = async (key: string, name: string, userId = shop.boss.id) =>
    (await api.as(userId))
      .post("/api/machines")
      .set("Idempotency-Key", key)
      .send({ ...table, name });
  const first = await send("key-number-1", "Once");
  const again = await send("key-number-1", "Once");
  expect([again.status, again.body]).toEqual([201, first.body]);
  const other = await send("key-number-1", "Twice");
  expect([other.status, other.body.type]).toEqual([422, "/problems/key-reused"]);
  expect((await send("short", "Never")).status).toBe(400);
  expect((await send("with blanks in it", "Never")).status).toBe(400);
});

test("a request that failed leaves its key free", async () => {
  const client = await boss();
  const send = (body: object) => client.post("/api/machines").set("Idempotency-Key", "key-number-2").send(body);
  expect((await send({ ...table, name: "Once" })).status).toBe(409);
  expect((await send({ ...table, name: "Another" })).status).toBe(201);
});

test("an answer to what anybody may call is not kept: a sign-out's holds the ID token", async () => {
  await (await boss()).post("/api/sign-out").set("Idempotency-Key", "key-number-4").expect(200);
  const { rows } = await api.owner.pool.query("select 1 from idempotency_keys where key = 'key-number-4'");
  expect(rows).toEqual([]);
});

test("a body nested beyond reason is no fault of ours, with a key too", async () => {
  const body = `{"name": ${"[".repeat(100_000)}${"]".repeat(100_000)}, "more": ${"[".repeat(20_000)}${"]".repeat(20_000)}}`;
  const { rows } = await api.owner.pool.query("select gen_random_uuid() as id");
  const client = await boss();
  const answer = await client
    .post(`/api/recipes/${rows[0].id}/retirement`)
    .set("Idempotency-Key", "key-number-5")
    .type("json")
    .send(body);
  expect(answer.status).toBe(404);
});

test("another person's key is another key, and the right to do it is asked for each time", async () => {
  const key = "key-number-3";
  const other = await makeStaffedShop(api.owner);
  const send = async (userId: string) =>
    (await api.as(userId))
      .post("/api/machines")
      .set("Idempotency-Key", key)
      .send({ ...table, name: "Same" });
  const [mine, theirs] = [await send(shop.boss.id), await send(other.boss.id)];
  expect([mine.status, theirs.status]).toEqual([201, 201]);
  expect(theirs.body.id).not.toBe(mine.body.id);
  await api.owner.pool.query("update shops set state = 'suspended' where id = $1", [other.shop.id]);
  expect((await send(other.boss.id)).status).toBe(403);
});
