import { afterAll, beforeAll, expect, test } from "vitest";
import { runQueuedBuild } from "#server/features/editions/run-build.ts";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { build, builderOf, makeContributors, publishNew } from "../../support/editions.ts";
import { makeAdmin, makeStaffedShop } from "../../support/factories.ts";

const groupId = "mild-steel_t3.15_n0.8_air";
let api: TestApi;
let admin: Awaited<ReturnType<typeof makeAdmin>>;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let contributors: Awaited<ReturnType<typeof makeContributors>>;

beforeAll(async () => {
  api = await createTestApi();
  admin = await makeAdmin(api.owner);
  own = await makeStaffedShop(api.owner);
  contributors = await makeContributors(api.owner, 12, { share: "listed" });
});
afterAll(() => api.close());

const states = async () =>
  (await api.owner.pool.query<{ state: string }>("select state from editions order by number")).rows.map(
    (r) => r.state,
  );

test("before the first edition there is none", async () => {
  const client = await api.as(own.operator.id);
  expect((await client.get("/api/editions/current").expect(200)).body).toEqual({ edition: null });
});

test("an admin asks for a build, the job runner does it, and its progress shows", async () => {
  const client = await api.as(admin.id);
  const asked = await client.post("/api/edition-builds").expect(202);
  expect(asked.body).toMatchObject({ state: "queued", groupsDone: 0, groupsTotal: null });
  expect((await client.post("/api/edition-builds").expect(409)).body.type).toBe("/problems/build-running");

  const seen: unknown[] = [];
  const onProgress = async () => {
    seen.push((await client.get("/api/edition-builds")).body.items[0].state);
    await client.post("/api/edition-builds").expect(409);
  };
  await runQueuedBuild(builderOf(api.database), { onProgress });
  expect(new Set(seen)).toEqual(new Set(["running"]));
  const { items } = (await client.get("/api/edition-builds").expect(200)).body;
  expect(items).toEqual([
    expect.objectContaining({ state: "done", groupsDone: 1, groupsTotal: 1, editionId: asked.body.id }),
  ]);
});

test("what a built edition says is nobody's to read until it is published, an admin's neither", async () => {
  const [{ id }] = (await (await api.as(admin.id)).get("/api/editions").expect(200)).body.items;
  const member = await api.as(own.operator.id);
  await member.get(`/api/editions/${id}/groups/${groupId}`).expect(404);
  await member.get(`/api/editions/${id}/materials/mild-steel/air`).expect(404);
  // Two builds with one shop suspended between them, subtracted, would show that shop's figures.
  await (await api.as(admin.id)).get(`/api/editions/${id}/groups/${groupId}`).expect(404);
  expect((await member.get("/api/editions/current")).body.edition).toBeNull();
});

test("published, it is there for every member, with the curves only where one group is asked for", async () => {
  const client = await api.as(admin.id);
  const [{ id }] = (await client.get("/api/editions")).body.items;
  const published = await client.post(`/api/editions/${id}/publication`).expect(200);
  const today = new Date().toISOString().slice(0, 10);
  expect(published.body).toMatchObject({ state: "published", date: today, releasedGroups: 1 });
  expect(published.body.changes.appeared).toHaveLength(1);

  const member = await api.as(own.operator.id);
  expect((await member.get("/api/editions/current")).body.edition).toEqual({ id, number: 1, date: today });
  const all = (await member.get(`/api/editions/${id}/materials/mild-steel/air`).expect(200)).body;
  expect(all.groups).toHaveLength(1);
  expect(all.groups[0].distributions.feedMmMin).toMatchObject({ density: null, shops: "10-19" });
  const one = (await member.get(`/api/editions/${id}/groups/${groupId}`).expect(200)).body;
  expect(one.figures.distributions.feedMmMin.density.heights).toHaveLength(64);
  expect(one.listed).toHaveLength(12);
  const entries = await api.owner.pool.query(
    "select actor_id, subject_id from audit_log where action = 'edition-published'",
  );
  expect(entries.rows).toEqual([{ actor_id: admin.id, subject_id: id }]);
});

test("figures name the day their edition came out, not the day it was built", async () => {
  const [{ id }] = (await (await api.as(admin.id)).get("/api/editions")).body.items;
  await api.owner.pool.query("alter table editions disable trigger editions_published");
  await api.owner.pool.query("update editions set published_at = '2026-03-04T10:00:00Z' where id = $1", [id]);
  await api.owner.pool.query("alter table editions enable trigger editions_published");
  const { body } = await (await api.as(own.operator.id)).get(`/api/editions/${id}/groups/${groupId}`).expect(200);
  expect(body.edition.date).toBe("2026-03-04");
  expect(body.figures.figuresFrom).toEqual({ number: 1, date: "2026-03-04" });
  expect(body.figures.distributions.currentA.figuresFrom).toEqual({ number: 1, date: "2026-03-04" });
});

test("no byte that a member gets leads to another shop", async () => {
  const { edition } = (await (await api.as(own.boss.id)).get("/api/editions/current")).body;
  const client = await api.as(own.boss.id);
  const texts = [
    (await client.get(`/api/editions/${edition.id}/materials/mild-steel/air`)).text,
    (await client.get(`/api/editions/${edition.id}/groups/${groupId}`)).text,
  ];
  const numbers = await api.owner.pool.query<{ number: string }>(
    "select number from contributors union select number from contributing_machines",
  );
  const telling = [
    ...contributors.flatMap(({ shop, machine, recipe }) => [shop.id, shop.name, machine.id, machine.name, recipe.id]),
    ...numbers.rows.map(({ number }) => number),
  ];
  for (const text of texts) expect(telling.filter((word) => text.includes(word))).toEqual([]);
});

test("a group nobody shows reads as too few shops; a name that is none is not found", async () => {
  const { edition } = (await (await api.as(own.boss.id)).get("/api/editions/current")).body;
  const client = await api.as(own.operator.id);
  const path = `/api/editions/${edition.id}/groups`;
  const { body } = await client.get(`${path}/brass_t5_n1_air`).expect(200);
  expect(body).toMatchObject({ figures: { status: "withheld", reason: "quorum" }, listed: [] });
  await client.get(`${path}/brass_t5.1_n1_air`).expect(404);
  await client.get(`${path}/nothing`).expect(404);
  await client.get(`/api/editions/${own.shop.id}/groups/brass_t5_n1_air`).expect(404);
});

test("a copy that is still good is not sent again, and belongs to its own address", async () => {
  const { edition } = (await (await api.as(own.boss.id)).get("/api/editions/current")).body;
  const client = await api.as(own.operator.id);
  const path = `/api/editions/${edition.id}/groups/${groupId}`;
  const first = await client.get(path).expect(200);
  const etag = first.headers.etag!;
  expect(first.headers["cache-control"]).toBe("private, no-cache");
  const again = await client.get(path).set("If-None-Match", etag).expect(304);
  expect(again.text).toBe("");
  await client.get(`/api/editions/${edition.id}/groups/brass_t5_n1_air`).set("If-None-Match", etag).expect(200);
});

test.each([
  "update editions set digest = 'x'",
  "delete from edition_groups",
  "update listed_recipes set recipe = '{}'",
])("a published edition refuses `%s`, even from the owner of the tables", async (statement) => {
  await expect(api.owner.pool.query(statement)).rejects.toThrow("a published edition never changes");
});

test("only the newest built edition can come out; older ones are thrown away with it", async () => {
  const [older, newer] = [await build(api.database), await build(api.database)];
  const client = await api.as(admin.id);
  const refused = await client.post(`/api/editions/${older.id}/publication`).expect(409);
  expect(refused.body).toMatchObject({
    type: "/problems/wrong-state",
    detail: expect.stringContaining("built after it"),
  });
  await client.post(`/api/editions/${newer.id}/publication`).expect(200);
  await client.post(`/api/editions/${newer.id}/publication`).expect(409);
  await client.delete(`/api/editions/${newer.id}`).expect(409);
  expect(await states()).toEqual(["published", "discarded", "published"]);
});

test("an edition that was compared with an older one than is out now cannot come out", async () => {
  const stale = await build(api.database);
  await api.owner.pool.query(
    "update editions set parameters = jsonb_set(parameters, '{comparedWith}', 'null') where id = $1",
    [stale.id],
  );
  const refused = await (await api.as(admin.id)).post(`/api/editions/${stale.id}/publication`).expect(409);
  expect(refused.body.detail).toContain("build again");
  await (await api.as(admin.id)).delete(`/api/editions/${stale.id}`).expect(204);
});

test("a discarded edition is gone to everybody, and the next build empties it", async () => {
  const client = await api.as(admin.id);
  const { id } = await build(api.database);
  await client.delete(`/api/editions/${id}`).expect(204);
  await client.get(`/api/editions/${id}/groups/${groupId}`).expect(404);
  await client.post(`/api/editions/${id}/publication`).expect(409);
  await publishNew(api.database);
  const left = await api.owner.pool.query("select 1 from edition_groups where edition_id = $1", [id]);
  expect(left.rows).toEqual([]);
});

test.each([
  ["post", "/api/edition-builds"],
  ["get", "/api/edition-builds"],
  ["get", "/api/editions"],
  ["post", `/api/editions/00000000-0000-4000-8000-000000000000/publication`],
  ["delete", `/api/editions/00000000-0000-4000-8000-000000000000`],
] as const)("%s %s is for admins alone", async (verb, path) => {
  await (await api.as())[verb](path).expect(401);
  await (await api.as(own.operator.id))[verb](path).expect(403);
  await (await api.as(own.boss.id))[verb](path).expect(403);
});

test("figures are for members: not for visitors, nor for a suspended shop", async () => {
  const { edition } = (await (await api.as(own.boss.id)).get("/api/editions/current")).body;
  const suspended = await makeStaffedShop(api.owner, { state: "suspended" });
  const path = `/api/editions/${edition.id}/groups/${groupId}`;
  await (await api.as()).get(path).expect(401);
  await (await api.as(suspended.boss.id)).get(path).expect(403);
});

test("a refusal carries no version of what was asked for", async () => {
  const client = await api.as(own.boss.id);
  const { edition } = (await client.get("/api/editions/current")).body;
  const answer = await client.get(`/api/editions/${edition.id}/groups/no-group`).expect(404);
  expect(answer.headers.etag).toBeUndefined();
  expect(answer.headers["cache-control"]).toBe("no-store");
});
