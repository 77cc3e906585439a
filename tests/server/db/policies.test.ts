import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, expect, test } from "vitest";
import { type Ask, actingAs, notAllowed, outcomeOf, type Settings } from "#tests/support/acting.ts";
import { openTestDatabase } from "#tests/support/database.ts";
import { makeRecipe, makeUser } from "#tests/support/factories.ts";
import { makeTwoShops } from "#tests/support/two-shops.ts";

/* What somebody could try with the API's own rights, if a handler let them. */

const foreignKey = "23503";
const restricted = "23001";

const { owner, web, close } = await openTestDatabase();
let world: Awaited<ReturnType<typeof makeTwoShops>>;

const attempt = (settings: Settings, text: string, values: unknown[] = []) =>
  outcomeOf(actingAs(web, settings, (ask: Ask) => ask(text, values)));

/** Somebody signed in who belongs to no shop, as the server knows them. */
async function makeOutsider() {
  const user = await makeUser(owner);
  return { user, settings: { user_id: user.id, email: user.email } };
}

const invite = (shopId: string, email: string, role: "owner" | "operator", accepted = false) =>
  owner.pool.query("insert into invitations (shop_id, email, role, accepted_at) values ($1, $2, $3, $4)", [
    shopId,
    email,
    role,
    accepted ? new Date() : null,
  ]);

const join = "insert into memberships (user_id, shop_id, role) values ($1, $2, $3)";

beforeAll(async () => {
  world = await makeTwoShops(owner);
});
afterAll(close);

test("an invitation makes its addressee a member in its role, once", async () => {
  const { user, settings } = await makeOutsider();
  await invite(world.victim.shop.id, user.email, "operator");
  expect(await attempt(settings, join, [user.id, world.victim.shop.id, "owner"])).toBe(notAllowed);
  expect(await attempt(settings, join, [user.id, world.stranger.shop.id, "operator"])).toBe(notAllowed);
  expect(await attempt(settings, join, [user.id, world.victim.shop.id, "operator"])).toBe(1);
});

test("nobody joins by another's invitation, by an accepted one, or on another's behalf", async () => {
  const [{ user, settings }, other] = [await makeOutsider(), await makeOutsider()];
  await invite(world.victim.shop.id, other.user.email, "owner");
  expect(await attempt(settings, join, [user.id, world.victim.shop.id, "owner"])).toBe(notAllowed);
  expect(await attempt(settings, join, [other.user.id, world.victim.shop.id, "owner"])).toBe(notAllowed);
  await invite(world.stranger.shop.id, user.email, "owner", true);
  expect(await attempt(settings, join, [user.id, world.stranger.shop.id, "owner"])).toBe(notAllowed);
});

test("an accepted invitation cannot be opened again, nor an open one redirected", async () => {
  const { user, settings } = await makeOutsider();
  await invite(world.victim.shop.id, user.email, "operator", true);
  expect(await attempt(settings, "update invitations set accepted_at = null")).toBe(0);
  await invite(world.victim.shop.id, user.email, "operator");
  expect(await attempt(settings, "update invitations set accepted_at = null")).toBe(notAllowed);
  expect(await attempt(settings, "update invitations set role = 'owner'")).toBe(notAllowed);
  expect(await attempt(settings, "update invitations set shop_id = $1", [world.stranger.shop.id])).toBe(notAllowed);
  expect(await attempt(settings, "update invitations set accepted_at = now()")).toBe(1);
});

test("an owner cannot write an invitation or a membership past the admins", async () => {
  const { boss, shop } = world.stranger;
  const settings = { user_id: boss.id, shop_id: shop.id, email: boss.email };
  const insert = "insert into invitations (shop_id, email, role) values ($1, 'new@friend.example', 'owner')";
  expect(await attempt(settings, insert, [shop.id])).toBe(notAllowed);
  expect(await attempt(settings, insert, [world.victim.shop.id])).toBe(notAllowed);
  expect(await attempt(settings, "update memberships set role = 'owner'")).toBe(notAllowed);
});

test("a person changes neither their address nor the identity they sign in with", async () => {
  const { user, settings } = await makeOutsider();
  expect(await attempt(settings, "update users set email = 'victim@shop.example' where id = $1", [user.id])).toBe(
    notAllowed,
  );
  expect(await attempt(settings, "update users set subject = 'another' where id = $1", [user.id])).toBe(restricted);
  expect(await attempt(settings, "update users set theme = 'dark'")).toBe(1);
});

test("whoever signs in takes over a prepared account of their own address alone", async () => {
  const prepared = await makeUser(owner, { provider: null, subject: null });
  const take = "update users set provider = 'idp', subject = 'me' where id = $1";
  const me = { identity: "idp|me" };
  expect(await attempt({ ...me, email: "me@else.example" }, take, [prepared.id])).toBe(0);
  expect(await attempt({ ...me, email: "" }, take, [prepared.id])).toBe(0);
  const asAnother = "update users set provider = 'idp', subject = 'somebody-else' where id = $1";
  expect(await attempt({ ...me, email: prepared.email }, asAnother, [prepared.id])).toBe(notAllowed);
  expect(await attempt({ ...me, email: prepared.email }, take, [prepared.id])).toBe(1);
});

test("an account in use is not taken over by another identity with the same address", async () => {
  const user = await makeUser(owner);
  const settings = { identity: "idp|other", email: user.email };
  expect(await attempt(settings, "update users set provider = 'idp', subject = 'other'")).toBe(0);
});

test("a first sign-in makes an account for its own address and identity alone", async () => {
  const insert = "insert into users (provider, subject, email, name) values ('idp', $1, $2, 'N')";
  const settings = { identity: "idp|fresh", email: "fresh@person.example" };
  expect(await attempt(settings, insert, ["fresh", "victim@person.example"])).toBe(notAllowed);
  expect(await attempt(settings, insert, ["another", "fresh@person.example"])).toBe(notAllowed);
  expect(await attempt({}, insert, ["fresh", "fresh@person.example"])).toBe(notAllowed);
  expect(await attempt(settings, insert, ["fresh", "fresh@person.example"])).toBe(1);
});

test.each([
  ["state", "'admitted'"],
  ["reason", "'Welcome'"],
  ["decided_at", "now()"],
  ["decided_by", `'${randomUUID()}'`],
  ["shop_id", `'${randomUUID()}'`],
])("nobody applies with %s already filled in", async (column, value) => {
  const insert = `insert into applications (id, shop_name, place, contact_name, email, machines, about, ${column})
    values (gen_random_uuid(), 'N', 'P', 'C', 'x@y.example', 1, 'about it', ${value})`;
  expect(await attempt({}, insert)).toBe(notAllowed);
});

test("an admin decides an application and does not rewrite it", async () => {
  const settings = { user_id: world.admin.id, admin: "yes" };
  expect(await attempt(settings, "update applications set email = 'mine@admin.example'")).toBe(notAllowed);
  expect(await attempt(settings, "delete from applications")).toBe(notAllowed);
});

test("an audit entry is in one's own name and of this moment", async () => {
  const { user, settings } = await makeOutsider();
  const insert = "insert into audit_log (actor_id, action, at) values ($1, 'x', ";
  expect(await attempt(settings, `${insert} now())`, [world.admin.id])).toBe(notAllowed);
  expect(await attempt(settings, `${insert} now())`, [null])).toBe(notAllowed);
  expect(await attempt(settings, `${insert} now() - interval '1 day')`, [user.id])).toBe(notAllowed);
  expect(await attempt(settings, `${insert} now())`, [user.id])).toBe(1);
});

test("the audit log stays as it is, also for the owner of the tables", async () => {
  const asOwner = (text: string) => outcomeOf(owner.pool.query(text));
  for (const change of ["detail = '{}'", "subject_id = null, actor_id = null", "action = ''"]) {
    expect(await asOwner(`update audit_log set ${change}`)).toBe(restricted);
  }
  expect(await asOwner("delete from audit_log")).toBe(restricted);
  expect(await asOwner("update audit_log set actor_id = null")).toBeGreaterThan(0);
});

test("a row of one's own never hangs on another shop's", async () => {
  const { victim, stranger } = world;
  const settings = { user_id: stranger.boss.id, shop_id: stranger.shop.id };
  const cut = `insert into test_cuts (shop_id, recipe_id, version_number, cut_at, cut_through, dross, top_edge, acceptable)
    values ($1, $2, 1, now(), true, 'none', 'square', true)`;
  expect(await attempt(settings, cut, [stranger.shop.id, victim.recipe.id])).toBe(foreignKey);
  const { recipe } = await makeRecipe(owner, victim.shop.id, victim.machine.id, { proven: true });
  const share = "insert into shares (recipe_id, shop_id, level) values ($1, $2, 'listed')";
  expect(await attempt(settings, share, [recipe.id, stranger.shop.id])).toBe(foreignKey);
  const version = (machineId: string, recipeId: string) =>
    attempt(
      settings,
      `insert into recipe_versions (recipe_id, shop_id, number, machine_id, material, surface, process_gas, thickness_mm, nozzle_mm, origin)
       values ($1, $2, 2, $3, 'mild-steel', 'clean', 'air', 3, 0.8, '{}')`,
      [recipeId, stranger.shop.id, machineId],
    );
  expect(await version(victim.machine.id, stranger.recipe.id)).toBe(foreignKey);
  expect(await version(stranger.machine.id, victim.recipe.id)).toBe(foreignKey);
});

test("a row is not handed to another shop", async () => {
  const { victim, stranger } = world;
  const settings = { user_id: stranger.boss.id, shop_id: stranger.shop.id };
  for (const table of ["machines", "recipes", "shares"]) {
    expect(await attempt(settings, `update ${table} set shop_id = $1`, [victim.shop.id])).toBe(notAllowed);
  }
});
