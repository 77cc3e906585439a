import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { build, makeContributors } from "../../support/editions.ts";
import { makeAdmin, makeMachine, makeRecipe, makeStaffedShop, makeTestCut } from "../../support/factories.ts";

let api: TestApi;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let other: Awaited<ReturnType<typeof makeStaffedShop>>;
let machine: Awaited<ReturnType<typeof makeMachine>>;

beforeAll(async () => {
  api = await createTestApi();
  own = await makeStaffedShop(api.owner, { name: "Quillfeather Plate Works" });
  other = await makeStaffedShop(api.owner);
  machine = await makeMachine(api.owner, own.shop.id, { name: "North table", note: "leaks at the regulator" });
});
afterAll(() => api.close());

/** In a metal of its own, so that tests do not meet in one peer group. */
const makeProven = (material: "copper" | "brass" | "aluminium" | "stainless-steel" | "mild-steel", values = {}) =>
  makeRecipe(api.owner, own.shop.id, machine.id, { proven: true, material, ...values });

const put = async (id: string, level: string, publicText = "", userId = own.boss.id) =>
  (await api.as(userId)).put(`/api/recipes/${id}/sharing`).send({ level, publicText });

test("an owner shares, changes the level and withdraws; each change is written down without the recipe", async () => {
  const { recipe } = await makeProven("copper");
  for (const level of ["counted", "listed", "private"]) {
    expect((await put(recipe.id, level)).body).toMatchObject({ level, notCountedBecause: null });
  }
  const shares = await api.owner.pool.query("select 1 from shares where recipe_id = $1", [recipe.id]);
  expect(shares.rows).toEqual([]);
  const { rows } = await api.owner.pool.query(
    "select subject_id, detail from audit_log where action = 'sharing-changed' order by id",
  );
  expect(rows.map((row) => row.detail)).toEqual([
    { from: "private", to: "counted" },
    { from: "counted", to: "listed" },
    { from: "listed", to: "private" },
  ]);
  expect(JSON.stringify(rows)).not.toContain(recipe.id);
});

test("an operator sees how a recipe is shared and may not change it", async () => {
  const { recipe } = await makeProven("brass");
  const client = await api.as(own.operator.id);
  const { body } = await client.get(`/api/recipes/${recipe.id}/sharing`).expect(200);
  expect(body.previews.map(({ level }: { level: string }) => level)).toEqual(["private", "counted", "listed"]);
  expect((await put(recipe.id, "counted", "", own.operator.id)).status).toBe(403);
});

test("another shop's recipe does not exist, nor does any for visitors and admins", async () => {
  const { recipe } = await makeProven("brass", { thicknessMm: 1 });
  const path = `/api/recipes/${recipe.id}`;
  const input = { level: "private", publicText: "" };
  const stranger = await api.as(other.boss.id);
  await stranger.get(`${path}/sharing`).expect(404);
  await stranger.put(`${path}/sharing`).send(input).expect(404);
  await stranger.post(`${path}/sharing-preview`).send(input).expect(404);
  const admin = await makeAdmin(api.owner);
  for (const [userId, status] of [
    [undefined, 401],
    [admin.id, 403],
  ] as const) {
    const client = await api.as(userId);
    await client.get(`${path}/sharing`).expect(status);
    await client.put(`${path}/sharing`).send(input).expect(status);
    await client.post(`${path}/sharing-preview`).send(input).expect(status);
  }
});

test("a recipe that is not proven, or retired, cannot be shared; withdrawing is always possible", async () => {
  const { recipe: draft } = await makeRecipe(api.owner, own.shop.id, machine.id);
  expect((await put(draft.id, "counted")).body.type).toBe("/problems/not-proven");
  const { recipe } = await makeProven("copper", { thicknessMm: 1, share: "counted" });
  await api.owner.pool.query("update recipes set state = 'retired' where id = $1", [recipe.id]);
  expect((await put(recipe.id, "listed")).body.type).toBe("/problems/wrong-state");
  const before = await (await api.as(own.operator.id)).get(`/api/recipes/${recipe.id}/sharing`);
  expect(before.body).toMatchObject({ level: "counted", notCountedBecause: "retired" });
  expect((await put(recipe.id, "private")).body).toMatchObject({ level: "private", notCountedBecause: null });
});

test("the preview of a listed recipe is what an edition then holds", async () => {
  const { recipe } = await makeProven("mild-steel", {
    arcVoltageV: 104.3,
    feedMmMin: 2347,
    note: "ask me about lead-ins",
  });
  const shared = await put(recipe.id, "listed", "Clean edge on new sheet.");
  const preview = shared.body.previews[2].listed;
  expect(preview).toMatchObject({
    setpoints: { arcVoltageV: 104.5, feedMmMin: 2350 },
    text: "Clean edge on new sheet.",
  });
  await makeContributors(api.owner, 6, { share: "listed" });
  const edition = await build(api.database);
  const { rows } = await api.owner.pool.query<{ recipe: { text: string | null } }>(
    "select recipe from listed_recipes where edition_id = $1",
    [edition.id],
  );
  const { id, ...held } = rows
    .map((row) => row.recipe as { id: string; text: string | null })
    .find(({ text }) => text)!;
  expect(held).toEqual(preview);
  expect(id).not.toBe(recipe.id);
});

test("what stays here is named with the shop's own values", async () => {
  const { recipe, version } = await makeProven("aluminium", {
    arcVoltageV: 104.3,
    note: "ask me about lead-ins",
    thicknessMm: 3.18,
  });
  await makeTestCut(api.owner, version, { note: "dross on the left" });
  const { body } = await (await api.as(own.operator.id)).get(`/api/recipes/${recipe.id}/sharing`).expect(200);
  for (const { listed, staysHere } of body.previews) {
    const kept = staysHere.map(({ value }: { value: string }) => value).join("\n");
    for (const value of ["Quillfeather", own.boss.name, "North table", "leaks", "lead-ins", "3.18 mm", "104.3 V"]) {
      expect(kept).toContain(value);
    }
    for (const value of ["Quillfeather", own.boss.name, "North table", "lead-ins", "3.18", "104.3"]) {
      expect(JSON.stringify(listed)).not.toContain(value);
    }
  }
  expect(body.previews.map(({ counts, listed }: never) => [counts, listed === null])).toEqual([
    [false, true],
    [true, true],
    [true, false],
  ]);
});

test("text that names the shop, its people or machines, or leads to them, is refused with every reason", async () => {
  const { recipe } = await makeProven("stainless-steel");
  const text = `Quillfeather setting by ${own.boss.name} on the north table, call 555-0100 or a@b.example, https://b.example`;
  const refused = await put(recipe.id, "listed", text);
  expect(refused.status).toBe(400);
  const errors: { pointer: string; detail: string }[] = refused.body.errors;
  expect(new Set(errors.map(({ pointer }) => pointer))).toEqual(new Set(["/publicText"]));
  expect(errors.map(({ detail }) => detail).join()).toMatch(/e-mail.*phone.*link.*shop.*somebody.*machines/);

  const tried = await (await api.as(own.operator.id))
    .post(`/api/recipes/${recipe.id}/sharing-preview`)
    .send({ level: "listed", publicText: text })
    .expect(200);
  expect(tried.body.textRefused).toHaveLength(errors.length);
  expect(tried.body.preview.listed.text).toBeNull();
  const kept = await api.owner.pool.query("select 1 from shares where recipe_id = $1", [recipe.id]);
  expect(kept.rows).toEqual([]);
});

test("words that hold a name the shop takes later are emptied before an edition shows them", async () => {
  const { recipe } = await makeProven("stainless-steel", { thicknessMm: 2 });
  const { recipe: other } = await makeProven("stainless-steel", { thicknessMm: 4 });
  const telling = "Best on Fernhollow, slowly.";
  expect((await put(recipe.id, "listed", telling)).body.publicText).toBe(telling);
  await put(other.id, "listed", "Clean edge.");
  const client = await api.as(own.boss.id);
  const { id, version, ...table } = (await client.get(`/api/machines/${machine.id}`)).body;
  const wordsOf = async (id: string) => (await client.get(`/api/recipes/${id}/sharing`)).body.publicText;
  const rename = (name: string, baseVersion: number) =>
    client.put(`/api/machines/${id}`).send({ ...table, name, baseVersion });
  await rename("Fernhollow", version).expect(200);
  expect([await wordsOf(recipe.id), await wordsOf(other.id)]).toEqual(["", "Clean edge."]);
  await rename(table.name, version + 1).expect(200);

  await put(recipe.id, "listed", telling);
  await client
    .post("/api/machines")
    .send({ ...table, name: "Fernhollow" })
    .expect(201);
  expect([await wordsOf(recipe.id), await wordsOf(other.id)]).toEqual(["", "Clean edge."]);
});

test("words typed for a recipe that is only counted are not kept", async () => {
  const { recipe } = await makeProven("stainless-steel", { thicknessMm: 1 });
  expect((await put(recipe.id, "counted", "Clean edge.")).body.publicText).toBe("");
});

test("of two shared recipes of one machine in one group the newer proof counts", async () => {
  const at = (day: string) => ({ thicknessMm: 8, share: "counted" as const, provenAt: new Date(`${day}T10:00:00Z`) });
  const { recipe: older } = await makeProven("brass", at("2026-05-01"));
  const { recipe: newer } = await makeProven("brass", { ...at("2026-06-01"), thicknessMm: 7.9 });
  const client = await api.as(own.operator.id);
  expect((await client.get(`/api/recipes/${older.id}/sharing`)).body.notCountedBecause).toBe("newer-recipe-counts");
  expect((await client.get(`/api/recipes/${newer.id}/sharing`)).body.notCountedBecause).toBeNull();
});

test("a changed recipe does not count until it is proven again", async () => {
  const { recipe, version } = await makeProven("copper", { thicknessMm: 5, share: "counted" });
  const client = await api.as(own.operator.id);
  const counted = async () =>
    (await api.owner.pool.query("select 1 from counted_contributions where material = 'copper' and band_index = 7"))
      .rows.length;
  expect(await counted()).toBe(1);
  const { content } = (await client.get(`/api/recipes/${recipe.id}`).expect(200)).body.version;
  const changed = { ...content, setpoints: { ...content.setpoints, arcVoltageV: 120 } };
  await client
    .put(`/api/recipes/${recipe.id}`)
    .send({ content: changed, reason: "", baseVersion: version.number })
    .expect(200);
  expect(await counted()).toBe(0);
  expect((await client.get(`/api/recipes/${recipe.id}/sharing`)).body).toMatchObject({
    level: "counted",
    notCountedBecause: "not-proven",
  });
  const cut = {
    versionNumber: 2,
    cutAt: "2026-09-01T10:00:00Z",
    cutThrough: true,
    dross: "none",
    topEdge: "square",
    acceptable: true,
  };
  const unmeasured = { bevelDeg: null, kerfWidthMm: null, uMm: null, rz5Um: null };
  await client
    .post(`/api/recipes/${recipe.id}/test-cuts`)
    .send({ ...cut, ...unmeasured })
    .expect(201);
  expect(await counted()).toBe(1);
});
