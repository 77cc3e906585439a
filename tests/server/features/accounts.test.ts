import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { makeAdmin, makeStaffedShop, makeUser } from "../../support/factories.ts";

let api: TestApi;
beforeAll(async () => {
  api = await createTestApi();
});
afterAll(() => api.close());

test("a visitor is nobody", async () => {
  const { body } = await (await api.as()).get("/api/session").expect(200);
  expect(body).toEqual({ user: null, shop: null, admin: false, units: "metric", theme: "system", demo: false });
});

test("an owner and an operator are told their shop and role", async () => {
  const { shop, boss, operator } = await makeStaffedShop(api.owner);
  const owner = await (await api.as(boss.id)).get("/api/session").expect(200);
  expect(owner.body).toMatchObject({
    user: { id: boss.id, name: boss.name, email: boss.email },
    shop: { id: shop.id, name: shop.name, state: "active", role: "owner" },
    admin: false,
  });
  const other = await (await api.as(operator.id)).get("/api/session").expect(200);
  expect(other.body.shop.role).toBe("operator");
});

test("an admin has no shop; somebody new has neither", async () => {
  const [admin, user] = [await makeAdmin(api.owner), await makeUser(api.owner)];
  expect((await (await api.as(admin.id)).get("/api/session")).body).toMatchObject({ admin: true, shop: null });
  expect((await (await api.as(user.id)).get("/api/session")).body).toMatchObject({ admin: false, shop: null });
});

test("somebody invited while signed in belongs to the shop when they next look", async () => {
  const [user, { shop }] = [await makeUser(api.owner), await makeStaffedShop(api.owner)];
  const client = await api.as(user.id);
  expect((await client.get("/api/session")).body.shop).toBeNull();
  const invite = "insert into invitations (shop_id, email, role) values ($1, $2, 'operator')";
  await api.owner.pool.query(invite, [shop.id, "somebody.else@person.example"]);
  expect((await client.get("/api/session")).body.shop, "an invitation to another address").toBeNull();
  await api.owner.pool.query(invite, [shop.id, user.email]);
  expect((await client.get("/api/session")).body.shop).toMatchObject({ id: shop.id, role: "operator" });
  await client.get("/api/recipes").expect(200);
});

test("an admin who also belongs to a shop acts for the network alone", async () => {
  const { boss } = await makeStaffedShop(api.owner);
  const client = await api.as(boss.id);
  await client.get("/api/book.json").expect(200);
  await api.owner.pool.query("insert into network_admins (user_id) values ($1)", [boss.id]);
  expect((await client.get("/api/session")).body).toMatchObject({ admin: true, shop: null });
  for (const path of ["/api/book.json", "/api/recipes", "/api/machines", "/api/peers/book"]) {
    await client.get(path).expect(403);
  }
  await client.post("/api/machines").send({}).expect(403);
  await client.get("/api/members").expect(200);
});

test("a person since removed is a visitor, whatever their cookie says", async () => {
  const user = await makeUser(api.owner);
  const client = await api.as(user.id);
  await api.owner.pool.query("delete from users where id = $1", [user.id]);
  expect((await client.get("/api/session").expect(200)).body.user).toBeNull();
  await client.patch("/api/account/preferences").send({ theme: "dark" }).expect(401);
});

test("preferences change one at a time and stay", async () => {
  const user = await makeUser(api.owner);
  const client = await api.as(user.id);
  const first = await client.patch("/api/account/preferences").send({ units: "inch" }).expect(200);
  expect(first.body).toMatchObject({ units: "inch", theme: "system" });
  await client.patch("/api/account/preferences").send({ theme: "dark" }).expect(200);
  expect((await client.get("/api/session")).body).toMatchObject({ units: "inch", theme: "dark" });
});

test.each([{ units: "furlong" }, { theme: 1 }, []])("refuses the preferences %j", async (body) => {
  const user = await makeUser(api.owner);
  await (await api.as(user.id)).patch("/api/account/preferences").send(body).expect(400);
});

test("preferences change nobody else and nothing else", async () => {
  const { boss, operator } = await makeStaffedShop(api.owner);
  await (await api.as(boss.id))
    .patch("/api/account/preferences")
    .send({ theme: "dark", email: "taken@over.example", name: "New", id: operator.id, admin: true })
    .expect(200);
  const { rows } = await api.owner.pool.query(
    "select theme, email, name from users where id = any($1) order by theme",
    [[boss.id, operator.id]],
  );
  expect(rows).toEqual([
    { theme: "system", email: operator.email, name: operator.name },
    { theme: "dark", email: boss.email, name: boss.name },
  ]);
});

test("a visitor has no preferences to change", async () => {
  await (await api.as()).patch("/api/account/preferences").send({ theme: "dark" }).expect(401);
});

test("a suspended shop's people may still choose a theme and sign out", async () => {
  const { boss } = await makeStaffedShop(api.owner, { state: "suspended" });
  const client = await api.as(boss.id);
  await client.patch("/api/account/preferences").send({ theme: "light" }).expect(200);
  await client.post("/api/sign-out").expect(200);
  expect((await client.get("/api/session")).body.user).toBeNull();
});

test("signing out ends this session and no other of the same person", async () => {
  const user = await makeUser(api.owner);
  const [here, elsewhere] = [await api.as(user.id), await api.as(user.id)];
  const { body } = await here.post("/api/sign-out").expect(200);
  expect(body.continueAt).toBe("http://127.0.0.1:4300/");
  expect((await here.get("/api/session")).body.user).toBeNull();
  expect((await elsewhere.get("/api/session")).body.user.id).toBe(user.id);
});

test("a visitor may sign out too, to no effect", async () => {
  await (await api.as()).post("/api/sign-out").expect(200);
});
