import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, expect, test } from "vitest";
import { createTestApi, type TestApi } from "../../support/api.ts";
import { makeAdmin, makeStaffedShop, makeUser } from "../../support/factories.ts";

let api: TestApi;
let admin: Awaited<ReturnType<typeof makeAdmin>>;

function applicationOf(email: string) {
  return {
    shopName: "Larkwater Cutting",
    place: "Nether Testham",
    contactName: "Bea Larkwater",
    email,
    machines: 1,
    about: "Brackets and gates in mild steel, 1.5 to 12 mm.",
  };
}

const freshEmail = () => `${randomUUID().slice(0, 8)}@applicant.example`;

let senders = 0;

/** Each from an address of its own: a few applications a minute are all that one address may send. */
async function apply(body: object, userId?: string) {
  senders += 1;
  const client = await api.as(userId);
  return client.post("/api/applications").set("X-Forwarded-For", `192.0.2.${senders}`).send(body);
}

/** Applies as a visitor and returns the application's id, as an admin finds it. */
async function makeApplication(email = freshEmail()): Promise<string> {
  expect((await apply(applicationOf(email))).status).toBe(201);
  const { rows } = await api.owner.pool.query(
    "select id from applications where email = $1 and state = 'waiting' order by created_at desc",
    [email],
  );
  return rows[0].id;
}

async function decide(id: string, what: "admission" | "refusal", body: object = {}, userId = admin.id) {
  return (await api.as(userId)).post(`/api/applications/${id}/${what}`).send(body);
}

const count = async (text: string, values: unknown[]) =>
  Number((await api.owner.pool.query(`select count(*) ${text}`, values)).rows[0].count);

beforeAll(async () => {
  api = await createTestApi({ TRUST_PROXY: "1" });
  admin = await makeAdmin(api.owner);
});
afterAll(() => api.close());

test("a visitor applies and the address is kept in lower case, without the blanks around it", async () => {
  const email = freshEmail();
  const answer = await apply(applicationOf(`  ${email.toUpperCase()} `));
  expect(answer.status).toBe(201);
  expect(answer.body).toEqual({ received: true });
  expect(await count("from applications where email = $1 and state = 'waiting'", [email])).toBe(1);
});

test("a second application while one waits is answered alike, stored not at all and changes nothing", async () => {
  const email = freshEmail();
  const first = await apply(applicationOf(email));
  const second = await apply({ ...applicationOf(email.toUpperCase()), shopName: "Somebody Else" });
  expect([second.status, second.body]).toEqual([first.status, first.body]);
  const { rows } = await api.owner.pool.query("select shop_name from applications where email = $1", [email]);
  expect(rows).toEqual([{ shop_name: "Larkwater Cutting" }]);
});

test("applications of one address sent at the same moment leave one", async () => {
  const email = freshEmail();
  const answers = await Promise.all(Array.from({ length: 6 }, () => apply(applicationOf(email))));
  expect(answers.map((answer) => answer.status)).toEqual(Array(6).fill(201));
  expect(await count("from applications where email = $1", [email])).toBe(1);
});

test.each([
  ["shopName", "x"],
  ["place", ""],
  ["contactName", " y "],
  ["email", "not an address"],
  ["email", "two@ats@shop.example"],
  ["email", `${"a".repeat(250)}@shop.example`],
  ["machines", 0],
  ["machines", 1.5],
  ["about", "short"],
  ["about", "has a zero character \u0000 in it"],
])("a wrong %s (%j) is refused at its field", async (field, value) => {
  const answer = await apply({ ...applicationOf(freshEmail()), [field]: value });
  expect(answer.status).toBe(400);
  expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toContain(`/${field}`);
});

test.each(["o'neil+plasma@cut.shop.example", "a@b.example", "first.last-1_2@sub-domain.shop.example", "9@9.example"])(
  "takes the odd but valid address %s",
  async (email) => {
    const id = await makeApplication(email);
    const admitted = await decide(id, "admission");
    expect([admitted.status, admitted.body.email]).toEqual([200, email]);
  },
);

test("markup in names stays text, letter for letter, in an answer that is no page", async () => {
  const email = freshEmail();
  const shopName = `<img src=x onerror="alert(1)"> & 'Söhne' {{1}}`;
  await apply({ ...applicationOf(email), shopName, contactName: "Robert'); drop table shops;--" });
  const listed = await (await api.as(admin.id)).get("/api/applications").expect(200);
  const found = listed.body.items.find((item: { email: string }) => item.email === email);
  expect([found.shopName, found.contactName]).toEqual([shopName, "Robert'); drop table shops;--"]);
  expect(listed.headers["content-type"]).toContain("application/json");
  expect(listed.headers["x-content-type-options"]).toBe("nosniff");
});

test("waiting applications come first, the longest waiting at the top", async () => {
  const [first, second, decided] = [await makeApplication(), await makeApplication(), await makeApplication()];
  await decide(decided, "refusal", { reason: "No plasma table in the shop." });
  const { body } = await (await api.as(admin.id)).get("/api/applications").expect(200);
  const ids: string[] = body.items.map((item: { id: string }) => item.id);
  expect(ids.indexOf(first)).toBeLessThan(ids.indexOf(second));
  expect(ids.indexOf(second)).toBeLessThan(ids.indexOf(decided));
  const states: string[] = body.items.map((item: { state: string }) => item.state);
  expect(states.lastIndexOf("waiting")).toBeLessThan(states.findIndex((state) => state !== "waiting"));
});

test("admitting makes the shop, one invitation as its owner, and an audit entry without the address", async () => {
  const email = freshEmail();
  const id = await makeApplication(email);
  const answer = await decide(id, "admission");
  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({ id, state: "admitted", decidedAt: expect.any(String) });
  expect(answer.body).not.toHaveProperty("decidedBy");
  const invited = await api.owner.pool.query(
    `select i.role, i.accepted_at, s.name, s.place, s.state, a.decided_by
     from invitations i join shops s on s.id = i.shop_id join applications a on a.shop_id = s.id where i.email = $1`,
    [email],
  );
  expect(invited.rows).toEqual([
    {
      role: "owner",
      accepted_at: null,
      name: "Larkwater Cutting",
      place: "Nether Testham",
      state: "active",
      decided_by: admin.id,
    },
  ]);
  const audit = await api.owner.pool.query("select actor_id, action, detail from audit_log where subject_id = $1", [
    id,
  ]);
  expect(audit.rows).toEqual([
    { actor_id: admin.id, action: "application-admitted", detail: { shopId: expect.any(String) } },
  ]);
});

test("two admins at once: one admits, the other learns that it has been decided, and there is one shop", async () => {
  const second = await makeAdmin(api.owner);
  const email = freshEmail();
  const id = await makeApplication(email);
  const answers = await Promise.all([decide(id, "admission"), decide(id, "admission", {}, second.id)]);
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
  const late = answers.find((answer) => answer.status === 409);
  expect(late?.body).toMatchObject({ type: "/problems/already-decided", current: { id, state: "admitted" } });
  expect(await count("from invitations where email = $1", [email])).toBe(1);
});

test("admitting and declining at once decides once", async () => {
  const id = await makeApplication();
  const answers = await Promise.all([decide(id, "admission"), decide(id, "refusal", { reason: "Too far away." })]);
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
});

test("declining keeps the reason for the applicant, and out of the audit log", async () => {
  const user = await makeUser(api.owner, { email: freshEmail() });
  const id = await makeApplication(user.email);
  expect((await decide(id, "refusal", { reason: "no" })).status).toBe(400);
  expect((await decide(id, "refusal", { reason: "Cuts by oxy-fuel only." })).status).toBe(200);
  const own = await (await api.as(user.id)).get("/api/account/application").expect(200);
  expect(own.body.application).toMatchObject({ state: "declined", reason: "Cuts by oxy-fuel only." });
  expect(Object.keys(own.body.application).sort()).toEqual(["createdAt", "reason", "shopName", "state"]);
  const audit = await api.owner.pool.query("select action, detail from audit_log where subject_id = $1", [id]);
  expect(audit.rows).toEqual([{ action: "application-declined", detail: {} }]);
});

test("after a refusal the same address may apply again, and sees the newest of both", async () => {
  const user = await makeUser(api.owner, { email: freshEmail() });
  await decide(await makeApplication(user.email), "refusal", { reason: "Cuts by oxy-fuel only." });
  await apply({ ...applicationOf(user.email), shopName: "Larkwater Plasma" });
  const own = await (await api.as(user.id)).get("/api/account/application").expect(200);
  expect(own.body.application).toMatchObject({ shopName: "Larkwater Plasma", state: "waiting" });
});

test("a member who applies again gets the usual answer and cannot be admitted a second time", async () => {
  const { boss } = await makeStaffedShop(api.owner);
  const id = await makeApplication(boss.email);
  const refused = await decide(id, "admission");
  expect([refused.status, refused.body.type]).toEqual([409, "/problems/already-exists"]);
  expect(await count("from invitations where email = $1", [boss.email])).toBe(0);
  expect((await decide(id, "refusal", { reason: "You are a member already." })).status).toBe(200);
});

test("somebody admitted who applies again before signing in is not admitted twice", async () => {
  const email = freshEmail();
  await decide(await makeApplication(email), "admission");
  const again = await makeApplication(email);
  const refused = await decide(again, "admission");
  expect([refused.status, refused.body.type]).toEqual([409, "/problems/already-exists"]);
  expect(await count("from applications a join shops s on s.id = a.shop_id where a.email = $1", [email])).toBe(1);
});

test("an applicant who is signed in sees their own application and nobody else's", async () => {
  const user = await makeUser(api.owner, { email: freshEmail() });
  const other = await makeUser(api.owner, { email: freshEmail() });
  expect((await apply(applicationOf(user.email), user.id)).status).toBe(201);
  const own = await (await api.as(user.id)).get("/api/account/application").expect(200);
  expect(own.body.application).toMatchObject({ shopName: "Larkwater Cutting", state: "waiting" });
  const others = await (await api.as(other.id)).get("/api/account/application").expect(200);
  expect(others.body).toEqual({ application: null });
});

test.each([
  ["a visitor", 401],
  ["somebody without a shop", 403],
  ["an owner", 403],
  ["an operator", 403],
] as const)("%s may neither list applications nor decide one", async (who, status) => {
  const { boss, operator } = await makeStaffedShop(api.owner);
  const nobody = await makeUser(api.owner);
  const userId = { "a visitor": undefined, "somebody without a shop": nobody.id, "an owner": boss.id }[who as string];
  const client = await api.as(who === "an operator" ? operator.id : userId);
  const id = await makeApplication();
  await client.get("/api/applications").expect(status);
  await client.post(`/api/applications/${id}/admission`).send({}).expect(status);
  await client.post(`/api/applications/${id}/refusal`).send({ reason: "Because." }).expect(status);
  expect(await count("from applications where id = $1 and state = 'waiting'", [id])).toBe(1);
});

test("a visitor has no application of their own to ask for", async () => {
  await (await api.as()).get("/api/account/application").expect(401);
});

test("an application that does not exist can be neither admitted nor declined", async () => {
  expect((await decide(randomUUID(), "admission")).status).toBe(404);
  expect((await decide("not-an-id", "refusal", { reason: "Whatever." })).status).toBe(404);
});
