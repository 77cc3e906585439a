import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { build, makeContributors, publishNew } from "../../support/editions.ts";
import { makeAdmin, makeMachine, makeRecipe, makeStaffedShop } from "../../support/factories.ts";

let api: TestApi;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let machineId: string;
let contributors: Awaited<ReturnType<typeof makeContributors>>;

beforeAll(async () => {
  api = await createTestApi();
  own = await makeStaffedShop(api.owner);
  machineId = (await makeMachine(api.owner, own.shop.id)).id;
  contributors = await makeContributors(api.owner, 12);
});
afterAll(() => api.close());

const readRanking = async () => (await (await api.as(own.operator.id)).get("/api/peers/book").expect(200)).body;

test("without an edition every recipe is without peers", async () => {
  await makeRecipe(api.owner, own.shop.id, machineId, { material: "brass" });
  expect(await readRanking()).toEqual({ edition: null, ranked: [], withoutPeers: 1 });
});

test("own recipes stand by how unusual they are, with what to check first", async () => {
  const add = (values: object) => makeRecipe(api.owner, own.shop.id, machineId, values);
  const usual = await add({ arcVoltageV: 109, feedMmMin: 2500 });
  const odd = await add({ arcVoltageV: 160, feedMmMin: 2500 });
  const provenOdd = await add({ arcVoltageV: 170, feedMmMin: 2500, proven: true });
  const retired = await add({ arcVoltageV: 180 });
  await api.owner.pool.query("update recipes set state = 'retired' where id = $1", [retired.recipe.id]);
  await publishNew(api.database);

  const { edition, ranked, withoutPeers } = await readRanking();
  expect(edition.number).toBe(1);
  expect(withoutPeers).toBe(1);
  expect(ranked.map((entry: { recipe: { id: string } }) => entry.recipe.id)).toEqual([
    provenOdd.recipe.id,
    odd.recipe.id,
    usual.recipe.id,
  ]);
  const [proven, unproven, typical] = ranked;
  expect(unproven.standings[0]).toMatchObject({
    metric: "arcVoltageV",
    value: 160,
    percentile: null,
    word: "unusually high",
  });
  expect(unproven.checkFirst).toMatch(
    /^Arc voltage is unusually high: that usually goes with .* Check the arc voltage/,
  );
  expect(proven.checkFirst).toContain("Different, and it works for you.");
  expect(typical.checkFirst).toBe("");
  expect(JSON.stringify(ranked)).not.toContain(contributors[0]!.shop.id);
});

test("what others give after the edition changes nothing, nor does an edition that is not out", async () => {
  const before = await readRanking();
  await makeContributors(api.owner, 6, { arcVoltageV: 170 });
  await build(api.database);
  expect(await readRanking()).toEqual(before);
});

test("a value of one's own changes one's own standing and nothing released", async () => {
  const { edition } = await readRanking();
  const client = await api.as(own.operator.id);
  const path = `/api/editions/${edition.id}/groups/mild-steel_t3.15_n0.8_air`;
  const before = (await client.get(path)).text;
  await makeRecipe(api.owner, own.shop.id, machineId, { arcVoltageV: 90, proven: true, share: "counted" });
  expect((await client.get(path)).text).toBe(before);
});

test("the ranking is for people of an active shop", async () => {
  const admin = await makeAdmin(api.owner);
  const suspended = await makeStaffedShop(api.owner, { state: "suspended" });
  for (const [userId, status] of [
    [undefined, 401],
    [admin.id, 403],
    [suspended.operator.id, 403],
  ] as const) {
    await (await api.as(userId)).get("/api/peers/book").expect(status);
  }
});
