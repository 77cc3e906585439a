import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { makeAdmin, makeMachine, makeRecipe, makeStaffedShop } from "../../support/factories.ts";

let api: TestApi;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let other: Awaited<ReturnType<typeof makeStaffedShop>>;

const table = {
  name: "North table",
  powerSourceMaxCurrentA: 65,
  startMethod: "contact",
  torchPressureBar: 5.2,
  dryness: "refrigerated",
  heightControl: "arc-voltage",
  heightControlSampleHz: 100,
  topFeedMmMin: 10_000,
  note: "the one by the door",
};

beforeAll(async () => {
  api = await createTestApi();
  own = await makeStaffedShop(api.owner);
  other = await makeStaffedShop(api.owner);
});
afterAll(() => api.close());

test("an owner describes a machine and everyone of the shop reads it", async () => {
  const created = await (await api.as(own.boss.id)).post("/api/machines").send(table).expect(201);
  expect(created.body).toMatchObject({ ...table, version: 1, recipes: 0 });
  const listed = await (await api.as(own.operator.id)).get("/api/machines").expect(200);
  expect(listed.body.items).toEqual([created.body]);
});

test("another shop's machine does not exist, to read, change or remove", async () => {
  const machine = await makeMachine(api.owner, other.shop.id);
  const client = await api.as(own.boss.id);
  await client.get(`/api/machines/${machine.id}`).expect(404);
  await client
    .put(`/api/machines/${machine.id}`)
    .send({ ...table, name: "Mine now", baseVersion: 1 })
    .expect(404);
  await client.delete(`/api/machines/${machine.id}`).expect(404);
});

test.each([
  ["a visitor", undefined, 401],
  ["an operator", "operator", 403],
  ["an admin", "admin", 403],
] as const)("%s may not describe a machine", async (_who, role, status) => {
  const admin = await makeAdmin(api.owner);
  const userId = role === "operator" ? own.operator.id : role === "admin" ? admin.id : undefined;
  await (await api.as(userId)).post("/api/machines").send(table).expect(status);
});

test("a wrong figure is refused at its field with the range in the member's unit", async () => {
  const client = await api.as(own.boss.id);
  const answer = await client
    .post("/api/machines")
    .send({ ...table, name: "X", topFeedMmMin: 5 })
    .expect(400);
  expect(answer.headers["content-type"]).toContain("application/problem+json");
  expect(answer.body.errors).toEqual([expect.objectContaining({ pointer: "/topFeedMmMin" })]);
});

test("a name taken in the shop is refused, in another shop it is free", async () => {
  const client = await api.as(own.boss.id);
  await client
    .post("/api/machines")
    .send({ ...table, name: "Twin" })
    .expect(201);
  const refused = await client
    .post("/api/machines")
    .send({ ...table, name: "Twin" })
    .expect(409);
  expect(refused.body.errors[0].pointer).toBe("/name");
  await (await api.as(other.boss.id))
    .post("/api/machines")
    .send({ ...table, name: "Twin" })
    .expect(201);
});

test("a change from an old version is refused and shows what the machine says now", async () => {
  const client = await api.as(own.boss.id);
  const { body } = await client
    .post("/api/machines")
    .send({ ...table, name: "Moving" })
    .expect(201);
  await client
    .put(`/api/machines/${body.id}`)
    .send({ ...table, name: "Moved", baseVersion: 1 })
    .expect(200);
  const stale = await client
    .put(`/api/machines/${body.id}`)
    .send({ ...table, name: "Late", baseVersion: 1 })
    .expect(409);
  expect(stale.body).toMatchObject({ type: "/problems/stale-version", current: { name: "Moved", version: 2 } });
});

test("a machine with recipes stays; one without goes", async () => {
  const client = await api.as(own.boss.id);
  const [kept, spare] = [await makeMachine(api.owner, own.shop.id), await makeMachine(api.owner, own.shop.id)];
  await makeRecipe(api.owner, own.shop.id, kept.id);
  await client.delete(`/api/machines/${kept.id}`).expect(409);
  await client.delete(`/api/machines/${spare.id}`).expect(204);
});

test("the same POST sent twice makes one machine", async () => {
  const client = await api.as(own.boss.id);
  const send = () =>
    client
      .post("/api/machines")
      .set("Idempotency-Key", "press-twice-1")
      .send({ ...table, name: "Once" });
  const [first, second] = await Promise.all([send(), send()]);
  expect([first.status, second.status]).toEqual([201, 201]);
  expect(second.body.id).toBe(first.body.id);
});

test("a write from another origin is refused", async () => {
  const client = await api.as(own.boss.id);
  await client.post("/api/machines").set("Origin", "http://elsewhere.example").send(table).expect(403);
});
