import { eq } from "drizzle-orm";
import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import { shops } from "#server/db/schema/shops.ts";
import { Recipe } from "#shared/contracts/recipes.ts";
import { createTestApi, type TestApi, type TestClient } from "../../support/api.ts";
import { type MadeMachine, makeBook, type StaffedShop } from "../../support/book.ts";
import { makeAdmin, makeMachine, makeRecipe, makeRecipeContent, plainSetpoints } from "../../support/factories.ts";

let api: TestApi;
let own: StaffedShop;
let other: StaffedShop;
let machine: MadeMachine;
let boss: TestClient;
let operator: TestClient;

const nobody = "00000000-0000-4000-8000-000000000000";

beforeAll(async () => {
  api = await createTestApi();
});
afterAll(() => api.close());

beforeEach(async () => {
  ({ own, other, machine, boss } = await makeBook(api));
  operator = await api.as(own.operator.id);
});

const suspend = () => api.owner.db.update(shops).set({ state: "suspended" }).where(eq(shops.id, own.shop.id));

async function create(client: TestClient, values: Parameters<typeof makeRecipeContent>[1] = {}) {
  const content = makeRecipeContent(machine.id, values);
  const { body } = await client.post("/api/recipes").send({ content, reason: "first try" }).expect(201);
  return Recipe.parse(body);
}

describe("keeping a recipe", () => {
  test.each(["boss", "operator"] as const)("the %s keeps a draft, version 1, under their own name", async (who) => {
    const recipe = await create(who === "boss" ? boss : operator, { grade: "S235", note: "left side" });
    expect(recipe).toMatchObject({
      ...{ machineName: machine.name, state: "draft", sharing: "private", testCuts: 0, acceptableTestCuts: 0 },
      version: {
        ...{ number: 1, reason: "first try", changedBy: own[who].name, proven: false },
        content: makeRecipeContent(machine.id, { grade: "S235", note: "left side" }),
        origin: { kind: "typed", editionNumber: null, basis: {} },
      },
    });
    expect((await operator.get(`/api/recipes/${recipe.id}`).expect(200)).body).toEqual(recipe);
  });

  test("answers with the contract's fields and none besides", async () => {
    const content = makeRecipeContent(machine.id);
    const { body } = await boss.post("/api/recipes").send({ content }).expect(201);
    expect(Object.keys(body).sort()).toEqual(Object.keys(Recipe.shape).sort());
    expect(Object.keys(body.version).sort()).toEqual(Object.keys(Recipe.shape.version.shape).sort());
    expect(JSON.stringify(body)).not.toContain(own.shop.id);
    expect(JSON.stringify(body)).not.toContain(own.boss.id);
  });

  test.each([
    ["a visitor", 401],
    ["an admin", 403],
    ["somebody of a suspended shop", 403],
  ] as const)("%s may not", async (who, status) => {
    const userId = who === "an admin" ? (await makeAdmin(api.owner)).id : own.boss.id;
    const client = await api.as(who === "a visitor" ? undefined : userId);
    if (status === 403) await suspend();
    await client
      .post("/api/recipes")
      .send({ content: makeRecipeContent(machine.id) })
      .expect(status);
  });

  test.each([
    ["/content/thicknessMm", { thicknessMm: 80 }],
    ["/content/setpoints/currentA", { setpoints: { ...plainSetpoints, currentA: 4 } }],
    ["/content/setpoints/pierceHeightMm", { setpoints: { ...plainSetpoints, cutHeightMm: 4, pierceHeightMm: 3 } }],
  ])("a wrong figure is refused at %s", async (pointer, values) => {
    const content = makeRecipeContent(machine.id, values);
    const { body } = await boss.post("/api/recipes").send({ content }).expect(400);
    expect(body.errors).toEqual([expect.objectContaining({ pointer })]);
  });

  test("another shop's machine is as unknown as one that does not exist", async () => {
    const foreign = await makeMachine(api.owner, other.shop.id);
    const refusals = [];
    for (const id of [foreign.id, nobody]) {
      const { body } = await boss
        .post("/api/recipes")
        .send({ content: makeRecipeContent(id) })
        .expect(400);
      refusals.push(body.errors);
    }
    expect(refusals[0]).toEqual([{ pointer: "/content/machineId", detail: "This shop has no such machine" }]);
    expect(refusals[1]).toEqual(refusals[0]);
  });

  test("the same POST sent twice at once makes one recipe", async () => {
    const content = makeRecipeContent(machine.id);
    const send = () => boss.post("/api/recipes").set("Idempotency-Key", "press-twice-2").send({ content });
    const [first, second] = await Promise.all([send(), send()]);
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(second.body).toEqual(first.body);
    expect((await boss.get("/api/recipes").expect(200)).body.total).toBe(1);
  });
});

describe("changing a recipe", () => {
  const faster = { ...plainSetpoints, feedMmMin: 2500 };
  const change = (client: TestClient, id: string, values: object, baseVersion = 1) =>
    client
      .put(`/api/recipes/${id}`)
      .send({ content: { ...makeRecipeContent(machine.id), ...values }, reason: "dross", baseVersion });

  test.each(["boss", "operator"] as const)("the %s saves a new version and the old one stays", async (who) => {
    const { id } = await create(boss);
    const { body } = await change(who === "boss" ? boss : operator, id, { setpoints: faster }).expect(200);
    expect(body.version).toMatchObject({ number: 2, reason: "dross", changedBy: own[who].name });
    const { items } = (await boss.get(`/api/recipes/${id}/versions`).expect(200)).body;
    expect(items.map((v: Recipe["version"]) => [v.number, v.content.setpoints.feedMmMin])).toEqual([
      [2, 2500],
      [1, plainSetpoints.feedMmMin],
    ]);
    expect(items[0]).toEqual(body.version);
  });

  test.each([
    ["a visitor", 401],
    ["an admin", 403],
    ["somebody of a suspended shop", 403],
    ["somebody of another shop", 404],
  ] as const)("%s may not", async (who, status) => {
    const { id } = await create(boss);
    const admin = await makeAdmin(api.owner);
    const users = { "a visitor": undefined, "an admin": admin.id, "somebody of another shop": other.boss.id };
    const client = who === "somebody of a suspended shop" ? boss : await api.as(users[who]);
    if (client === boss) await suspend();
    await change(client, id, { setpoints: faster }).expect(status);
  });

  test("a wrong field is refused where it stands", async () => {
    const { id } = await create(boss);
    const { body } = await change(boss, id, { nozzleMm: 9 }).expect(400);
    expect(body.errors[0].pointer).toBe("/content/nozzleMm");
    const foreign = await makeMachine(api.owner, other.shop.id);
    const refused = await change(boss, id, { machineId: foreign.id }).expect(400);
    expect(refused.body.errors[0].pointer).toBe("/content/machineId");
    expect((await boss.get(`/api/recipes/${id}`)).body.version.number).toBe(1);
  });

  test("from an old version it is refused and shows the newest", async () => {
    const { id } = await create(boss);
    const newest = await change(operator, id, { setpoints: faster }).expect(200);
    const late = await change(boss, id, { grade: "S355" }).expect(409);
    expect(late.body).toMatchObject({ type: "/problems/stale-version", current: newest.body });
    expect(Object.keys(late.body.current).sort()).toEqual(Object.keys(Recipe.shape).sort());
    await change(boss, id, { grade: "S355" }, 7).expect(409);
  });

  test("of many at once from one version one is saved and each other sees it", async () => {
    const { id } = await create(boss);
    const feeds = [2400, 2450, 2500, 2550, 2600, 2650];
    const answers = await Promise.all(
      feeds.map((feedMmMin, i) =>
        change(i % 2 ? boss : operator, id, { setpoints: { ...plainSetpoints, feedMmMin } }).then((answer) => answer),
      ),
    );
    const saved = answers.filter(({ status }) => status === 200);
    const refused = answers.filter(({ status }) => status === 409);
    expect([saved.length, refused.length]).toEqual([1, 5]);
    for (const { body } of refused) expect(body.current).toEqual(saved[0]?.body);
    expect((await boss.get(`/api/recipes/${id}/versions`)).body.items).toHaveLength(2);
  });

  test("to what it says already makes no version, even when sent again after the answer was lost", async () => {
    const { id } = await create(boss);
    expect((await change(boss, id, {}).expect(200)).body.version.number).toBe(1);
    const once = await change(boss, id, { setpoints: faster }).expect(200);
    const again = await change(boss, id, { setpoints: faster }).expect(200);
    expect(again.body).toEqual(once.body);
    expect((await boss.get(`/api/recipes/${id}/versions`)).body.items).toHaveLength(2);
  });

  test("makes a proven recipe a draft again, its sharing level kept, and keeps the old proof", async () => {
    const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { proven: true, share: "counted" });
    const { body } = await change(boss, recipe.id, { setpoints: faster }).expect(200);
    expect(body).toMatchObject({ state: "draft", sharing: "counted", version: { number: 2, proven: false } });
    const { items } = (await boss.get(`/api/recipes/${recipe.id}/versions`)).body;
    expect(items.map((v: Recipe["version"]) => v.proven)).toEqual([false, true]);
  });

  test("of the note alone keeps it proven from the same day", async () => {
    const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { proven: true });
    const { body } = await change(boss, recipe.id, { note: "mind the clamp" }).expect(200);
    expect(body).toMatchObject({ state: "proven", version: { number: 2, proven: true } });
    const { rows } = await api.owner.pool.query(
      "select count(distinct proven_at)::int as days, count(*)::int as versions from recipe_versions where recipe_id = $1",
      [recipe.id],
    );
    expect(rows).toEqual([{ days: 1, versions: 2 }]);
  });

  test("keeps where the recipe came from", async () => {
    const origin = { kind: "starting-recipe" as const, editionNumber: 4, basis: { feedMmMin: "peers" } };
    const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { origin });
    const { body } = await change(boss, recipe.id, { setpoints: faster }).expect(200);
    expect(body.version.origin).toEqual(origin);
  });
});
