import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, expect, test } from "vitest";
import { withClient } from "#server/db/bootstrap.ts";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { makeAdmin, makeMachine, makeRecipe, makeShop, makeStaffedShop, makeUser } from "../../support/factories.ts";

let api: TestApi;
let admin: Awaited<ReturnType<typeof makeAdmin>>;

const reason = "Shared recipes it had not cut.";
const suspend = async (id: string, userId = admin.id) =>
  (await api.as(userId)).post(`/api/members/${id}/suspension`).send({ reason });
const reinstate = async (id: string, userId = admin.id) =>
  (await api.as(userId)).delete(`/api/members/${id}/suspension`);

async function listNames(query: string): Promise<string[]> {
  const { body } = await (await api.as(admin.id)).get(`/api/members?${query}`).expect(200);
  return body.items.map((item: { name: string }) => item.name);
}

beforeAll(async () => {
  api = await createTestApi();
  admin = await makeAdmin(api.owner);
});
afterAll(() => api.close());

test("an admin sees how much a member shares, and nothing of what", async () => {
  const { shop } = await makeStaffedShop(api.owner, { name: "Counted Shop" });
  const machine = await makeMachine(api.owner, shop.id);
  await makeMachine(api.owner, shop.id);
  await makeRecipe(api.owner, shop.id, machine.id, { proven: true, share: "listed", note: "secret" });
  await makeRecipe(api.owner, shop.id, machine.id, { proven: true });
  const { body } = await (await api.as(admin.id)).get("/api/members?search=Counted").expect(200);
  expect(body.items).toEqual([
    {
      id: shop.id,
      name: "Counted Shop",
      place: "Testham",
      state: "active",
      stateReason: "",
      joinedAt: shop.joinedAt.toISOString(),
      people: 2,
      machines: 2,
      sharedRecipes: 1,
    },
  ]);
});

test("members come by name in any case, found by part of name or place, signs taken as they are", async () => {
  const tag = randomUUID().slice(0, 8);
  await makeShop(api.owner, { name: `beta ${tag}` });
  await makeShop(api.owner, { name: `Alpha ${tag}` });
  await makeShop(api.owner, { name: `50% Off ${tag}_x`, place: `Port ${tag}` });
  expect(await listNames(`search=${tag.toUpperCase()}`)).toEqual([`50% Off ${tag}_x`, `Alpha ${tag}`, `beta ${tag}`]);
  expect(await listNames(`search=port+${tag}`)).toEqual([`50% Off ${tag}_x`]);
  expect(await listNames(`search=${encodeURIComponent(`50% Off ${tag}_`)}`)).toEqual([`50% Off ${tag}_x`]);
  expect(await listNames(`search=${encodeURIComponent(`%${tag}`)}`)).toEqual([]);
  expect(await listNames(`search=${encodeURIComponent(`'; drop table shops; --${tag}`)}`)).toEqual([]);
});

test("members can be listed by state; a state that does not exist is refused", async () => {
  const { shop } = await makeStaffedShop(api.owner, { state: "suspended", name: `Gone ${randomUUID()}` });
  expect(await listNames("state=suspended")).toContain(shop.name);
  expect(await listNames("state=active")).not.toContain(shop.name);
  await (await api.as(admin.id)).get("/api/members?state=odd").expect(400);
  await (await api.as(admin.id)).get("/api/members?search=%00").expect(400);
});

test("suspension says why, shuts the shop out at once and is written down", async () => {
  const { shop, boss, operator } = await makeStaffedShop(api.owner);
  const [bossClient, operatorClient] = [await api.as(boss.id), await api.as(operator.id)];
  await bossClient.get("/api/machines").expect(200);
  const answer = await suspend(shop.id);
  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({ id: shop.id, state: "suspended", stateReason: reason });
  await bossClient.get("/api/machines").expect(401);
  await operatorClient.get("/api/machines").expect(401);
  const left = await api.owner.pool.query("select 1 from sessions where sess #>> '{passport,user}' = any($1)", [
    [boss.id, operator.id],
  ]);
  expect(left.rowCount).toBe(0);
  const audit = await api.owner.pool.query("select actor_id, action, detail from audit_log where subject_id = $1", [
    shop.id,
  ]);
  expect(audit.rows).toEqual([{ actor_id: admin.id, action: "member-suspended", detail: { reason } }]);
});

test("who signs in to a suspended shop again learns of it and can do nothing", async () => {
  const { shop, boss } = await makeStaffedShop(api.owner);
  await suspend(shop.id);
  const client = await api.as(boss.id);
  const session = await client.get("/api/session").expect(200);
  expect(session.body.shop).toMatchObject({ id: shop.id, state: "suspended", role: "owner" });
  const refused = await client.get("/api/machines").expect(403);
  expect(refused.body.type).toBe("/problems/shop-suspended");
});

test("another shop's sessions outlive a suspension", async () => {
  const [gone, staying] = [await makeStaffedShop(api.owner), await makeStaffedShop(api.owner)];
  const client = await api.as(staying.boss.id);
  await suspend(gone.shop.id);
  await client.get("/api/machines").expect(200);
});

test("a suspended shop's contributions are not counted, and are again when it is taken back", async () => {
  const { shop, boss } = await makeStaffedShop(api.owner);
  const machine = await makeMachine(api.owner, shop.id);
  await makeRecipe(api.owner, shop.id, machine.id, { proven: true, share: "counted", feedMmMin: 2222 });
  const countContributions = () =>
    withClient(api.database.builderUrl, async (client) => {
      const { rowCount } = await client.query("select 1 from counted_contributions where feed_mm_min = 2222");
      return rowCount;
    });
  expect(await countContributions()).toBe(1);
  await suspend(shop.id);
  expect(await countContributions()).toBe(0);
  const back = await reinstate(shop.id);
  expect(back.body).toMatchObject({ state: "active", stateReason: "" });
  expect(await countContributions()).toBe(1);
  await (await api.as(boss.id)).get("/api/machines").expect(200);
});

test("a shop is suspended once and taken back once, also by two admins at a time", async () => {
  const { shop } = await makeStaffedShop(api.owner);
  const second = await makeAdmin(api.owner);
  const suspended = await Promise.all([suspend(shop.id), suspend(shop.id, second.id)]);
  expect(suspended.map((answer) => answer.status).sort()).toEqual([200, 409]);
  const returned = await Promise.all([reinstate(shop.id), reinstate(shop.id, second.id)]);
  expect(returned.map((answer) => answer.status).sort()).toEqual([200, 409]);
  const audit = await api.owner.pool.query("select action from audit_log where subject_id = $1 order by id", [shop.id]);
  expect(audit.rows.map((row) => row.action)).toEqual(["member-suspended", "member-reinstated"]);
});

test("a suspension needs a reason and a member", async () => {
  const { shop } = await makeStaffedShop(api.owner);
  const client = await api.as(admin.id);
  const short = await client.post(`/api/members/${shop.id}/suspension`).send({ reason: "  no  " }).expect(400);
  expect(short.body.errors).toEqual([{ pointer: "/reason", detail: "Give the reason" }]);
  expect((await suspend(randomUUID())).status).toBe(404);
  expect((await reinstate(randomUUID())).status).toBe(404);
});

test.each([
  ["a visitor", 401],
  ["somebody without a shop", 403],
  ["an owner", 403],
  ["an operator", 403],
] as const)("%s may not see or change members", async (who, status) => {
  const { shop, boss, operator } = await makeStaffedShop(api.owner);
  const nobody = await makeUser(api.owner);
  const ids = { "a visitor": undefined, "somebody without a shop": nobody.id, "an owner": boss.id };
  const userId = who === "an operator" ? operator.id : ids[who];
  await (await api.as(userId)).get("/api/members").expect(status);
  await (await api.as(userId)).post(`/api/members/${shop.id}/suspension`).send({ reason }).expect(status);
  await (await api.as(userId)).delete(`/api/members/${shop.id}/suspension`).expect(status);
  expect(await listNames(`search=${shop.name}`)).toEqual([shop.name]);
});
