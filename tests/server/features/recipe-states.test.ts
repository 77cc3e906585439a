import { eq } from "drizzle-orm";
import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import { memberships } from "#server/db/schema/memberships.ts";
import { shops } from "#server/db/schema/shops.ts";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { createTestApi, type TestApi, type TestClient } from "../../support/api.ts";
import { type MadeMachine, makeBook, type StaffedShop } from "../../support/book.ts";
import { makeAdmin, makeRecipe, makeRecipeContent, makeTestCut, plainSetpoints } from "../../support/factories.ts";

let api: TestApi;
let own: StaffedShop;
let other: StaffedShop;
let machine: MadeMachine;
let boss: TestClient;

beforeAll(async () => {
  api = await createTestApi();
});
afterAll(() => api.close());

beforeEach(async () => {
  ({ own, other, machine, boss } = await makeBook(api));
});

/** Id of a draft one of the shop keeps. */
async function keepRecipe(client = boss): Promise<string> {
  const content = makeRecipeContent(machine.id);
  return (await client.post("/api/recipes").send({ content }).expect(201)).body.id;
}

/** How many recipes of the shop an edition built now would count. */
async function countCounted(): Promise<number | null> {
  const counted = await api.owner.pool.query(
    "select 1 from counted_contributions v join contributors c on c.number = v.shop where c.shop_id = $1",
    [own.shop.id],
  );
  return counted.rowCount;
}

describe("retiring and bringing back", () => {
  test("retires, refuses changes meanwhile, and comes back as it was", async () => {
    const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { proven: true, share: "listed" });
    const path = `/api/recipes/${recipe.id}`;
    expect(await countCounted()).toBe(1);
    const retired = await boss.post(`${path}/retirement`).expect(200);
    expect(retired.body).toMatchObject({ state: "retired", sharing: "listed" });
    expect(await countCounted()).toBe(0);
    const content = makeRecipeContent(machine.id, { grade: "other" });
    const refused = await boss.put(path).send({ content, baseVersion: 1 }).expect(409);
    expect(refused.body.type).toBe("/problems/wrong-state");
    expect((await boss.delete(`${path}/retirement`).expect(200)).body.state).toBe("proven");
    expect(await countCounted()).toBe(1);
  });

  test("an unproven recipe comes back as a draft", async () => {
    const id = await keepRecipe();
    await boss.post(`/api/recipes/${id}/retirement`).expect(200);
    expect((await boss.delete(`/api/recipes/${id}/retirement`).expect(200)).body.state).toBe("draft");
  });

  test("neither can be done twice", async () => {
    const path = `/api/recipes/${await keepRecipe()}/retirement`;
    expect((await boss.delete(path).expect(409)).body.type).toBe("/problems/wrong-state");
    await boss.post(path).expect(200);
    expect((await boss.post(path).expect(409)).body.type).toBe("/problems/wrong-state");
  });

  test("the same POST sent twice retires once and gives the same answer", async () => {
    const path = `/api/recipes/${await keepRecipe()}/retirement`;
    const first = await boss.post(path).set("Idempotency-Key", "retire-twice").expect(200);
    expect((await boss.post(path).set("Idempotency-Key", "retire-twice").expect(200)).body).toEqual(first.body);
  });

  test.each([
    ["a visitor", 401],
    ["an operator", 403],
    ["an admin", 403],
    ["another shop's owner", 404],
    ["the owner of a suspended shop", 403],
  ] as const)("%s may do neither", async (who, status) => {
    const path = `/api/recipes/${await keepRecipe()}/retirement`;
    const users = {
      "a visitor": undefined,
      "an operator": own.operator.id,
      "an admin": (await makeAdmin(api.owner)).id,
      "another shop's owner": other.boss.id,
      "the owner of a suspended shop": own.boss.id,
    };
    const client = await api.as(users[who]);
    if (who === "the owner of a suspended shop") {
      await api.owner.db.update(shops).set({ state: "suspended" }).where(eq(shops.id, own.shop.id));
    }
    await client.post(path).expect(status);
    await client.delete(path).expect(status);
  });
});

describe("what counts", () => {
  test("a shared recipe changed at a setpoint counts no more, one changed at its note counts on", async () => {
    const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { proven: true, share: "counted" });
    const change = (values: Parameters<typeof makeRecipeContent>[1], baseVersion: number) =>
      boss
        .put(`/api/recipes/${recipe.id}`)
        .send({ content: makeRecipeContent(machine.id, values), baseVersion })
        .expect(200);
    await change({ note: "mind the clamp" }, 1);
    expect(await countCounted()).toBe(1);
    await change({ setpoints: { ...plainSetpoints, feedMmMin: 2500 } }, 2);
    expect(await countCounted()).toBe(0);
  });
});

describe("reading", () => {
  test("another shop's recipe does not exist", async () => {
    const id = await keepRecipe();
    const stranger = await api.as(other.boss.id);
    await stranger.get(`/api/recipes/${id}`).expect(404);
    await stranger.get(`/api/recipes/${id}/versions`).expect(404);
    expect((await stranger.get("/api/recipes").expect(200)).body).toEqual({ items: [], next: null, total: 0 });
    await boss.get("/api/recipes/not-an-id").expect(404);
  });

  test("somebody who left the shop is no longer named", async () => {
    const id = await keepRecipe(await api.as(own.operator.id));
    await api.owner.db.delete(memberships).where(eq(memberships.userId, own.operator.id));
    expect((await boss.get(`/api/recipes/${id}`)).body.version.changedBy).toBe("");
    expect((await boss.get(`/api/recipes/${id}/versions`)).body.items[0].changedBy).toBe("");
  });

  test("test cuts of all versions are counted, each recipe for itself", async () => {
    const { recipe, version } = await makeRecipe(api.owner, own.shop.id, machine.id, {
      proven: true,
      share: "counted",
    });
    await makeTestCut(api.owner, version, { acceptable: false });
    await makeRecipe(api.owner, own.shop.id, machine.id);
    const { items } = (await boss.get("/api/recipes").expect(200)).body;
    const counts = items.map((r: Recipe) => [r.id === recipe.id, r.testCuts, r.acceptableTestCuts, r.sharing]);
    expect(counts).toContainEqual([true, 2, 1, "counted"]);
    expect(counts).toContainEqual([false, 0, 0, "private"]);
  });
});
