import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { build, makeContributors, publishNew } from "../../support/editions.ts";
import { makeAdmin, makeMachine, makeStaffedShop } from "../../support/factories.ts";

let api: TestApi;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let other: Awaited<ReturnType<typeof makeStaffedShop>>;
let machineId: string;
let query: string;

beforeAll(async () => {
  api = await createTestApi();
  own = await makeStaffedShop(api.owner);
  other = await makeStaffedShop(api.owner);
  machineId = (await makeMachine(api.owner, own.shop.id)).id;
  query = `material=mild-steel&thicknessMm=3.2&nozzleMm=0.8&machineId=${machineId}`;
});
afterAll(() => api.close());

test("before any edition it stands on practice and tests, and says so", async () => {
  const { body } = await (await api.as(own.operator.id)).get(`/api/starting-recipes?${query}`).expect(200);
  expect(body).toMatchObject({ schemaVersion: 1, edition: null, gas: "air" });
  expect(body.setpoints.currentA.basis).toBe("practice");
  expect(body.setpoints.arcVoltageV).toMatchObject({ value: null, basis: "none" });
  expect(body.cautions.length).toBeGreaterThan(0);
  expect(body.testPlan.length).toBeGreaterThan(0);
});

test("with peers in the current edition it stands on them, and not on one that is not out", async () => {
  await makeContributors(api.owner, 8);
  await build(api.database);
  const read = async () =>
    (await (await api.as(own.operator.id)).get(`/api/starting-recipes?${query}`).expect(200)).body;
  expect((await read()).edition).toBeNull();
  await publishNew(api.database);
  const body = await read();
  expect(body).toMatchObject({ edition: { number: 2 }, groupId: "mild-steel_t3.15_n0.8_air" });
  expect(body.setpoints.arcVoltageV).toMatchObject({ basis: "peers" });
  expect(body.setpoints.arcVoltageV.low).toBeLessThan(body.setpoints.arcVoltageV.value);
});

test("the CSV says the same, one setpoint a row, cautions and all", async () => {
  const client = await api.as(own.operator.id);
  const { body } = await client.get(`/api/starting-recipes?${query}`).expect(200);
  const csv = await client.get(`/api/starting-recipes.csv?${query}`).expect(200);
  expect(csv.headers["content-type"]).toContain("text/csv");
  expect(csv.headers["content-disposition"]).toContain("starting-recipe-mild-steel-3.2mm.csv");
  const lines = csv.text.split("\r\n");
  const { value, low, high } = body.setpoints.arcVoltageV;
  expect(lines.find((line) => line.startsWith("Arc voltage"))).toContain(
    `Arc voltage,${value},${low},${high},V,Peers,`,
  );
  expect(lines.filter((line) => line.startsWith("Caution"))).toHaveLength(body.cautions.length);
});

test("kept in the book it is a draft that knows where each value came from", async () => {
  const client = await api.as(own.operator.id);
  const wanted = (await client.get(`/api/starting-recipes?${query}`)).body;
  const input = { material: "mild-steel", thicknessMm: 3.2, nozzleMm: 0.8, machineId };
  const { body } = await client.post("/api/starting-recipes").send(input).expect(201);
  expect(body).toMatchObject({ state: "draft", sharing: "private", version: { number: 1, proven: false } });
  expect(body.version.content).toMatchObject({ surface: "clean", processGas: "air", thicknessMm: 3.2, nozzleMm: 0.8 });
  expect(body.version.content.setpoints.arcVoltageV).toBe(wanted.setpoints.arcVoltageV.value);
  expect(body.version.origin).toMatchObject({
    kind: "starting-recipe",
    editionNumber: 2,
    basis: { arcVoltageV: "peers" },
  });
  await client.get(`/api/recipes/${body.id}`).expect(200);
});

test("without a nozzle one is advised; where nobody knows one it cannot be kept", async () => {
  const client = await api.as(own.operator.id);
  const advised = await client
    .get(`/api/starting-recipes?material=mild-steel&thicknessMm=3.2&machineId=${machineId}`)
    .expect(200);
  expect(advised.body.nozzle).toMatchObject({ nozzleMm: 0.8, chosenBy: "peers" });
  const input = { material: "copper", gas: "nitrogen", thicknessMm: 3, machineId };
  const refused = await client.post("/api/starting-recipes").send(input).expect(400);
  expect(refused.body.errors).toEqual([expect.objectContaining({ pointer: "/nozzleMm" })]);
});

test("another shop's machine does not exist; outsiders get nothing; wrong figures are named", async () => {
  const admin = await makeAdmin(api.owner);
  const path = `/api/starting-recipes?${query}`;
  for (const [userId, status] of [
    [other.operator.id, 404],
    [admin.id, 403],
    [undefined, 401],
  ] as const) {
    const client = await api.as(userId);
    await client.get(path).expect(status);
    await client.get(path.replace("?", ".csv?")).expect(status);
    await client.post("/api/starting-recipes").send({ material: "brass", thicknessMm: 2, machineId }).expect(status);
  }
  const wrong = await (await api.as(own.operator.id)).get(path.replace("3.2", "500")).expect(400);
  expect(wrong.body.errors).toEqual([expect.objectContaining({ pointer: "?thicknessMm" })]);
});
