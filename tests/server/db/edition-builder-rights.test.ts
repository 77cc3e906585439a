import { afterAll, expect, test } from "vitest";
import { openTestDatabase } from "../../support/database.ts";
import { makeContributor } from "../../support/editions.ts";

const { owner, web, builder, close } = await openTestDatabase();

afterAll(close);

const hidden = ["users", "shops", "machines", "recipes", "recipe_versions", "shares", "test_cuts", "memberships"];

test.each([...hidden, "contributors", "contributing_machines", "sessions", "invitations", "applications"])(
  "the edition builder reads no row of %s",
  async (table) => {
    await expect(builder.pool.query(`select 1 from ${table}`)).rejects.toThrow("permission denied");
  },
);

test("the edition builder sees contributions without name, id, note or e-mail", async () => {
  const { shop, machine, recipe } = await makeContributor(owner, 0, { note: "only for us" });
  const seen = JSON.stringify((await builder.pool.query("select * from counted_contributions")).rows);
  expect(seen).toContain("mild-steel");
  for (const own of [shop.id, shop.name, machine.id, machine.name, recipe.id, "only for us"]) {
    expect(seen).not.toContain(own);
  }
});

test("the edition builder writes in the audit log in nobody's name but its own, and reads none of it", async () => {
  const user = await owner.pool.query("insert into users (email, name) values ('a@person.example', 'A') returning id");
  const write = (actor: string | null) =>
    builder.pool.query("insert into audit_log (actor_id, action) values ($1, 'edition-published')", [actor]);
  await expect(write(user.rows[0].id)).rejects.toThrow("row-level security");
  await write(null);
  await expect(builder.pool.query("select 1 from audit_log")).rejects.toThrow("permission denied");
});

test("the web role reads neither what editions remember nor whose number is whose", async () => {
  for (const table of ["edition_memories", "contributors", "contributing_machines", "counted_contributions"]) {
    await expect(web.pool.query(`select 1 from ${table}`), table).rejects.toThrow("permission denied");
  }
});
