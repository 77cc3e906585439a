import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { actingAs, notAllowed, outcomeOf, type Settings } from "#tests/support/acting.ts";
import { openTestDatabase } from "#tests/support/database.ts";
import { makeTwoShops } from "#tests/support/two-shops.ts";

/**
 * What another shop's owner sees of each table when a query asks for everything: rows of their own shop and person
 * alone, nothing, what is published, or a refusal to look at all. A new table fails here until somebody decides.
 */
const decisions: Record<string, "own" | "nothing" | "published" | "refused"> = {
  "drizzle.__drizzle_migrations": "refused",
  applications: "own",
  audit_log: "nothing",
  contributing_machines: "refused",
  contributors: "refused",
  counted_contributions: "refused",
  edition_builds: "nothing",
  edition_groups: "published",
  edition_memories: "refused",
  editions: "published",
  idempotency_keys: "own",
  invitations: "nothing",
  listed_recipes: "published",
  machines: "own",
  memberships: "own",
  network_admins: "nothing",
  rate_limits: "nothing",
  recipe_versions: "own",
  recipes: "own",
  sessions: "nothing",
  shares: "own",
  shops: "own",
  test_cuts: "own",
  users: "own",
};
const views = ["counted_contributions"];
const tables = Object.keys(decisions).filter((name) => !views.includes(name));

const { owner, web, close } = await openTestDatabase();
let world: Awaited<ReturnType<typeof makeTwoShops>>;
let settings: Settings;

interface Row {
  ctid: string;
  xmin: string;
  json: Record<string, unknown>;
}

/** Every row, as the owner of the tables sees it. `xmin` changes whenever anybody writes the row. */
async function listAll(table: string): Promise<Row[]> {
  const { rows } = await owner.pool.query(
    `select ctid::text, xmin::text, to_jsonb(t) as json from ${table} t order by ctid`,
  );
  return rows;
}

/** Rows that speak of the stranger, by any id or address of theirs. */
function ofStranger({ json }: Row): boolean {
  const { shop, boss, operator } = world.stranger;
  return [shop.id, boss.id, operator.id, boss.email].some((id) => JSON.stringify(json).includes(id));
}

beforeAll(async () => {
  world = await makeTwoShops(owner);
  const { boss, shop } = world.stranger;
  settings = { user_id: boss.id, shop_id: shop.id, email: boss.email };
});
afterAll(close);

test("every table and view of the database has a decision", async () => {
  const { rows } = await owner.pool.query(
    `select case nspname when 'public' then relname else nspname || '.' || relname end as name
     from pg_class c join pg_namespace n on n.oid = relnamespace
     where relkind in ('r', 'p', 'v', 'm', 'f') and nspname !~ '^pg_' and nspname <> 'information_schema'`,
  );
  expect(rows.map((row) => row.name).sort()).toEqual(Object.keys(decisions).sort());
});

test("every table of the schema has row-level security", async () => {
  const { rows } = await owner.pool.query(
    "select relname from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p') and not relrowsecurity",
  );
  expect(rows).toEqual([]);
});

describe.each(tables)("%s", (table) => {
  const refused = decisions[table] === "refused";

  test("holds rows of another for this proof", async () => {
    const rows = await listAll(table);
    expect(rows.filter((row) => !ofStranger(row)).length).toBeGreaterThan(0);
  });

  test("shows a query without any filter what was decided", async () => {
    const seen = actingAs(web, settings, (ask) => ask(`select to_jsonb(t) as json from ${table} t`));
    if (refused) return expect(await outcomeOf(seen)).toBe(notAllowed);
    const all = await listAll(table);
    const ids = [world.published, world.unpublished];
    const expected = {
      own: all.filter(ofStranger),
      nothing: [],
      published: all.filter(({ json }) => JSON.stringify(json).includes(ids[0]!)),
      refused: [],
    }[decisions[table]!];
    expect((await seen).rows.map((row) => row.json)).toEqual(expected.map((row) => row.json));
    if (decisions[table] === "own") expect(expected.length).toBeGreaterThan(0);
  });

  test("shows nothing while a visitor acts", async () => {
    const seen = await outcomeOf(actingAs(web, {}, (ask) => ask(`select * from ${table}`)));
    expect(seen).toBe(refused ? notAllowed : 0);
  });

  test("shows nothing without an actor, but for what the server itself counts and keeps", async () => {
    const seen = await outcomeOf(actingAs(web, null, (ask) => ask(`select * from ${table}`)));
    if (["sessions", "rate_limits"].includes(table)) expect(seen).toBe((await listAll(table)).length);
    else expect(seen).toBe(refused ? notAllowed : 0);
  });

  test("takes no row made in another's name", async () => {
    const { rows: columns } = await owner.pool.query(
      `select string_agg(quote_ident(attname), ', ') as names from pg_attribute
       where attrelid = $1::regclass and attnum > 0 and not attisdropped and attidentity <> 'a'`,
      [table],
    );
    const { names } = columns[0];
    for (const { json } of (await listAll(table)).filter((row) => !ofStranger(row))) {
      const statement = `insert into ${table} (${names}) select ${names} from jsonb_populate_record(null::${table}, $1)`;
      const outcome = await outcomeOf(actingAs(web, settings, (ask) => ask(statement, [json])));
      expect(outcome).toBe(notAllowed);
    }
  });

  test("keeps another's rows through an update of everything, column by column", async () => {
    const before = (await listAll(table)).filter((row) => !ofStranger(row));
    for (const column of Object.keys(before[0]!.json)) {
      const update = `update ${table} set ${column} = ${column}`;
      const ctids = before.map((row) => row.ctid);
      const aimed = await outcomeOf(
        actingAs(web, settings, (ask) => ask(`${update} where ctid = any($1::tid[])`, [ctids])),
      );
      // An identity column refuses before any right is asked for.
      expect([0, notAllowed, "428C9"]).toContain(aimed);
      await outcomeOf(actingAs(web, settings, (ask) => ask(update)));
    }
    expect((await listAll(table)).filter((row) => !ofStranger(row))).toEqual(before);
  });
});

test.each(views)("%s is closed to whoever acts, and to the server itself", async (view) => {
  for (const who of [settings, { admin: "yes" }, null]) {
    expect(await outcomeOf(actingAs(web, who, (ask) => ask(`select * from ${view}`)))).toBe(notAllowed);
  }
});

// Last, and from the end of the alphabet, so that what holds a row goes before it: the stranger deletes all they can.
test.each([...tables].reverse())("deleting everything from %s leaves another's rows", async (table) => {
  const before = (await listAll(table)).filter((row) => !ofStranger(row));
  const outcome = await outcomeOf(actingAs(web, settings, (ask) => ask(`delete from ${table}`)));
  if (["idempotency_keys", "machines", "recipes", "shares"].includes(table)) expect(outcome).toBe(1);
  else expect(outcome).toBe(["sessions", "rate_limits"].includes(table) ? 0 : notAllowed);
  expect((await listAll(table)).filter((row) => !ofStranger(row))).toEqual(before);
});
