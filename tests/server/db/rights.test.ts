import { afterAll, beforeAll, expect, test } from "vitest";
import { openDatabase } from "#server/db/client.ts";
import { actingAs, notAllowed, outcomeOf } from "#tests/support/acting.ts";
import { openTestDatabase } from "#tests/support/database.ts";
import { makeTwoShops } from "#tests/support/two-shops.ts";

const { owner, web, builder, webUrl, close } = await openTestDatabase();
let world: Awaited<ReturnType<typeof makeTwoShops>>;

beforeAll(async () => {
  world = await makeTwoShops(owner);
});
afterAll(close);

const asOwnerOfShop = (text: string) => {
  const { boss, shop } = world.victim;
  return outcomeOf(actingAs(web, { user_id: boss.id, shop_id: shop.id, email: boss.email }, (ask) => ask(text)));
};

/** Columns each role may write, by table; a whole table's right counts for each column. */
async function listWritable(role: string, right: "UPDATE" | "INSERT"): Promise<Record<string, string[]>> {
  const { rows } = await owner.pool.query(
    `select relname as table, array_agg(attname::text order by attnum) as columns
     from pg_class c join pg_attribute a on a.attrelid = c.oid and attnum > 0 and not attisdropped
     where relnamespace = 'public'::regnamespace and relkind in ('r', 'p', 'v')
       and has_column_privilege($1, c.oid, attnum, $2) group by relname order by relname`,
    [role, right],
  );
  return Object.fromEntries(rows.map((row) => [row.table, row.columns]));
}

test("what a version says is never changed: web may write only when it was proven", async () => {
  const writable = await listWritable("web", "UPDATE");
  expect(writable.recipe_versions).toEqual(["proven_at"]);
  for (const column of ["feed_mm_min", "current_a", "note", "origin", "changed_by", "number"]) {
    expect(await asOwnerOfShop(`update recipe_versions set ${column} = ${column}`)).toBe(notAllowed);
  }
  expect(await asOwnerOfShop("update recipe_versions set proven_at = now()")).toBe(1);
  expect(await asOwnerOfShop("delete from recipe_versions")).toBe(notAllowed);
});

test("web may update these columns and no other", async () => {
  const { idempotency_keys, machines, rate_limits, recipes, sessions, shares, ...narrow } = await listWritable(
    "web",
    "UPDATE",
  );
  expect(narrow).toEqual({
    applications: ["state", "reason", "decided_at", "decided_by", "shop_id"],
    editions: ["state", "published_at", "published_by"],
    invitations: ["accepted_at"],
    recipe_versions: ["proven_at"],
    shops: ["state", "state_reason"],
    users: ["provider", "subject", "name", "units", "theme"],
  });
});

test("web may insert into these tables and no other", async () => {
  expect(Object.keys(await listWritable("web", "INSERT"))).toEqual([
    "applications",
    "audit_log",
    "edition_builds",
    "idempotency_keys",
    "invitations",
    "machines",
    "memberships",
    "rate_limits",
    "recipe_versions",
    "recipes",
    "sessions",
    "shares",
    "shops",
    "test_cuts",
    "users",
  ]);
});

test("web does not read the opaque numbers, whoever acts", async () => {
  for (const table of ["contributors", "contributing_machines", "counted_contributions", "edition_memories"]) {
    const look = actingAs(web, { user_id: world.admin.id, admin: "yes" }, (ask) => ask(`select * from ${table}`));
    expect(await outcomeOf(look)).toBe(notAllowed);
  }
});

test("the edition builder reads contributions and editions, and no name and no person", async () => {
  const { rows } = await owner.pool.query(
    `select relname from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p', 'v')
       and has_any_column_privilege('edition_builder', oid, 'SELECT') order by relname`,
  );
  const readable = rows.map((row) => row.relname);
  expect(readable).toEqual([
    "counted_contributions",
    "edition_builds",
    "edition_groups",
    "edition_memories",
    "editions",
    "listed_recipes",
  ]);
  for (const table of ["users", "shops", "memberships", "machines", "recipes", "shares", "sessions", "contributors"]) {
    expect(await outcomeOf(builder.pool.query(`select * from ${table}`))).toBe(notAllowed);
  }
});

test("a contribution carries no name, note or id of a shop, person, recipe or machine", async () => {
  const { rows } = await builder.pool.query("select to_jsonb(c) as json from counted_contributions c");
  expect(rows.length).toBe(2);
  const text = JSON.stringify(rows);
  for (const { shop, boss, machine, recipe, version } of [world.victim, world.stranger]) {
    for (const secret of [shop.id, shop.name, shop.place, boss.id, boss.name, boss.email, machine.id, machine.name]) {
      expect(text).not.toContain(secret);
    }
    expect(text).not.toContain(recipe.id);
    expect(text).not.toContain(version.recipeId);
  }
  expect(Object.keys(rows[0].json).filter((name) => /name|note|user|email|id$/.test(name))).toEqual([]);
});

test("functions that run with their owner's rights say nothing to anybody but an admin", async () => {
  const { boss, shop } = world.stranger;
  const settings = { user_id: boss.id, shop_id: shop.id };
  await owner.pool.query("insert into sessions (sid, sess, expire) values ('v', $1, now() + interval '1 hour')", [
    { passport: { user: world.victim.boss.id } },
  ]);
  const ask = (text: string, values: unknown[]) => actingAs(web, settings, (run) => run(text, values));
  expect((await ask("select * from member_overview()", [])).rows).toEqual([]);
  expect((await ask("select email_standing($1) as it", [world.victim.boss.email])).rows).toEqual([{ it: null }]);
  expect((await ask("select end_shop_sessions($1) as it", [world.victim.shop.id])).rows).toEqual([{ it: 0 }]);
  for (const call of ["member_overview()", "email_standing('a')", "end_shop_sessions(gen_random_uuid())"]) {
    expect(await outcomeOf(builder.pool.query(`select ${call}`))).toBe(notAllowed);
  }
});

test("every function with its owner's rights fixes where it looks for tables", async () => {
  const { rows } = await owner.pool.query(
    `select proname, proconfig from pg_proc where pronamespace = 'public'::regnamespace and prosecdef`,
  );
  expect(rows.length).toBeGreaterThan(0);
  for (const row of rows) expect(row.proconfig).toEqual(["search_path=public, pg_temp"]);
});

test.each([
  "set row_security = off; select * from machines",
  "set role tempermark_owner",
  "set session authorization tempermark_owner",
  "alter table machines disable row level security",
  "create temp table mine (id int)",
])("neither web nor the builder gets around the rules: %s", async (text) => {
  for (const { pool } of [web, builder]) {
    const client = await pool.connect();
    expect(await outcomeOf(client.query(text))).toBe(notAllowed);
    client.release(true);
  }
});

test("settings of one transaction are gone in the next on the same connection", async () => {
  const single = openDatabase(webUrl, { max: 1 });
  const { boss, shop } = world.victim;
  await actingAs(single, { user_id: boss.id, shop_id: shop.id, email: boss.email, admin: "yes" }, (ask) =>
    ask("select 1"),
  );
  const { rowCount } = await actingAs(single, {}, (ask) => ask("select * from machines"));
  expect(rowCount).toBe(0);
  await single.close();
});
