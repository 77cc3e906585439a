import { randomUUID } from "node:crypto";
import type { Database } from "#server/db/client.ts";
import { makeAdmin, makeMachine, makeRecipe, makeStaffedShop } from "./factories.ts";

/** A shop with something in every tenant table, its newest recipe listed. */
async function makeFullShop(owner: Database) {
  const staffed = await makeStaffedShop(owner);
  const machine = await makeMachine(owner, staffed.shop.id);
  const { recipe, version } = await makeRecipe(owner, staffed.shop.id, machine.id, { proven: true, share: "listed" });
  const q = (text: string, values: unknown[]) => owner.pool.query(text, values);
  await q("insert into idempotency_keys (user_id, key, request_digest) values ($1, 'some-key', 'd')", [
    staffed.boss.id,
  ]);
  await q(
    `insert into applications (id, shop_name, place, contact_name, email, machines, about, state, decided_at, shop_id)
     values (gen_random_uuid(), 'N', 'P', 'C', $1, 1, 'about it', 'admitted', now(), $2)`,
    [staffed.boss.email, staffed.shop.id],
  );
  await q("insert into invitations (shop_id, email, role) values ($1, $2, 'operator')", [
    staffed.shop.id,
    `${randomUUID().slice(0, 8)}@invited.example`,
  ]);
  await q("insert into audit_log (actor_id, action, subject_id) values ($1, 'something', $2)", [
    staffed.boss.id,
    staffed.shop.id,
  ]);
  await q("insert into sessions (sid, sess, expire) values ($1, '{}', now() + interval '1 day')", [randomUUID()]);
  await q("insert into rate_limits (caller, hits, reset_at) values ($1, 1, now())", [randomUUID()]);
  return { ...staffed, machine, recipe, version };
}

async function makeEdition(owner: Database, number: number, state: "built" | "published") {
  const id = randomUUID();
  const q = (text: string, values: unknown[]) => owner.pool.query(text, values);
  await q(
    `insert into editions (id, number, digest, parameters, network_figures, changes) values ($1, $2, 'd', '{}', '{}', '{}')`,
    [id, number],
  );
  const group = "'group', 'mild-steel', 'air', 5, 0.8";
  const columns = "(edition_id, group_id, material, process_gas, band_index, nozzle_mm";
  await q(`insert into edition_groups ${columns}, figures) values ($1, ${group}, '{}')`, [id]);
  await q(`insert into edition_memories ${columns}, memory) values ($1, ${group}, '{}')`, [id]);
  await q("insert into listed_recipes (edition_id, group_id, recipe) values ($1, 'group', '{}')", [id]);
  await q("insert into edition_builds (edition_id, state) values ($1, 'done')", [id]);
  if (state === "published") await q("update editions set state = 'published' where id = $1", [id]);
  return id;
}

/** Two shops that know nothing of each other, an admin, one edition published and one not: a row in every table. */
export async function makeTwoShops(owner: Database) {
  const [victim, stranger] = [await makeFullShop(owner), await makeFullShop(owner)];
  const admin = await makeAdmin(owner);
  const published = await makeEdition(owner, 1, "published");
  const unpublished = await makeEdition(owner, 2, "built");
  return { victim, stranger, admin, published, unpublished };
}
