import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, openDatabase } from "#server/db/client.ts";
import { runDirectBuild, runQueuedBuild } from "#server/features/editions/run-build.ts";
import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { createTestDatabase, type TestDatabase } from "../../support/database.ts";
import { build, builderOf, makeContributor, makeContributors, publishNew } from "../../support/editions.ts";
import { makeMachine, makeRecipe } from "../../support/factories.ts";

const groupId = "mild-steel_t3.15_n0.8_air";
let database: TestDatabase;
let owner: Database;

beforeEach(async () => {
  database = await createTestDatabase();
  owner = openDatabase(database.ownerUrl);
});
afterEach(async () => {
  await owner.close();
  await database.drop();
});

async function query<Row extends object>(text: string, values: unknown[] = []): Promise<Row[]> {
  return (await owner.pool.query<Row>(text, values)).rows;
}

async function figuresIn(editionId: string, id = groupId): Promise<PeerGroupFigures | undefined> {
  const rows = await query<{ figures: PeerGroupFigures }>(
    "select figures from edition_groups where edition_id = $1 and group_id = $2",
    [editionId, id],
  );
  return rows[0]?.figures;
}

describe("who counts", () => {
  // Threshold rule, FCSM Statistical Policy Working Paper 22; five is this network's own setting.
  test("four shops leave no trace, five are shown", async () => {
    await makeContributors(owner, 4);
    const few = await publishNew(database);
    expect(await figuresIn(few.id)).toBeUndefined();
    expect(await query("select 1 from edition_memories")).toEqual([]);
    await makeContributor(owner, 4);
    const enough = await publishNew(database);
    expect(await figuresIn(enough.id)).toMatchObject({ status: "released", shops: "5-9", recipes: "5-9" });
  });

  test("a shop with many machines is one shop", async () => {
    const [first] = await makeContributors(owner, 4);
    for (let i = 0; i < 6; i++) {
      const machine = await makeMachine(owner, first!.shop.id);
      await makeRecipe(owner, first!.shop.id, machine.id, { proven: true, share: "counted" });
    }
    expect(await figuresIn((await build(database)).id)).toBeUndefined();
  });

  test("a suspended shop leaves the next edition", async () => {
    const shops = await makeContributors(owner, 5);
    expect(await figuresIn((await build(database)).id)).toBeDefined();
    await query("update shops set state = 'suspended' where id = $1", [shops[0]!.shop.id]);
    expect(await figuresIn((await build(database)).id)).toBeUndefined();
  });

  test("private, unproven and retired recipes do not count", async () => {
    await makeContributors(owner, 4);
    const others = [
      await makeContributor(owner, 5),
      await makeContributor(owner, 6),
      await makeContributor(owner, 7, { proven: false }),
    ];
    await query("delete from shares where recipe_id = $1", [others[0]!.recipe.id]);
    await query("update recipes set state = 'retired' where id = $1", [others[1]!.recipe.id]);
    expect(await figuresIn((await build(database)).id)).toBeUndefined();
  });
});

describe("the three-shop step between editions", () => {
  test("one newcomer changes nothing that is shown; three do", async () => {
    await makeContributors(owner, 6);
    const first = await publishNew(database);
    await makeContributor(owner, 30);
    const held = await publishNew(database);
    expect(await figuresIn(held.id)).toEqual(await figuresIn(first.id));
    const [row] = await query<{ changes: object }>("select changes from editions where id = $1", [held.id]);
    expect(row?.changes).toMatchObject({ appeared: [], changed: [], unchanged: 0, held: [{ material: "mild-steel" }] });
    await makeContributor(owner, 31);
    await makeContributor(owner, 32);
    const moved = await figuresIn((await publishNew(database)).id);
    expect(moved).toMatchObject({ figuresFrom: { number: 3 } });
  });

  test("what one shop took back stays in at most two editions more, then the group is withheld", async () => {
    const shops = await makeContributors(owner, 7);
    const first = await publishNew(database);
    await query("delete from shares where recipe_id = $1", [shops[0]!.recipe.id]);
    const [second, third, fourth] = [
      await publishNew(database),
      await publishNew(database),
      await publishNew(database),
    ];
    expect(await figuresIn(second.id)).toEqual(await figuresIn(first.id));
    expect(await figuresIn(third.id)).toEqual(await figuresIn(first.id));
    expect(await figuresIn(fourth.id)).toMatchObject({ status: "withheld", reason: "three-shop-step" });
    const [row] = await query<{ changes: object }>("select changes from editions where id = $1", [fourth.id]);
    expect(row?.changes).toMatchObject({ withheld: [{ bandIndex: 5 }] });
  });

  test("a group that everybody left is gone, and still compared when they come back", async () => {
    await makeContributors(owner, 5);
    await publishNew(database);
    await query("update shops set state = 'suspended'");
    const empty = await publishNew(database);
    expect(await figuresIn(empty.id)).toBeUndefined();
    expect(await query("select 1 from edition_memories where edition_id = $1", [empty.id])).toHaveLength(1);
    await query("update shops set state = 'active'");
    const back = await publishNew(database);
    expect(await figuresIn(back.id)).toMatchObject({ status: "released", figuresFrom: { number: 1 } });
  });

  test("an edition that was never published is not what the next one is compared with", async () => {
    await makeContributors(owner, 5);
    await build(database);
    await makeContributor(owner, 9);
    const next = await build(database);
    expect(await figuresIn(next.id)).toMatchObject({ figuresFrom: { number: 2 } });
  });

  test("another key for the marks builds nothing and says why", async () => {
    await makeContributors(owner, 5);
    await publishNew(database);
    const result = await runDirectBuild({ ...builderOf(database), marksKey: "another-key-0123456789-abcdefghij" });
    expect(result).toMatchObject({ outcome: "failed", message: expect.stringContaining("EDITION_MARKS_KEY") });
    expect(await query("select 1 from editions")).toHaveLength(1);
  });
});

describe("listed recipes", () => {
  const listed = { share: "listed" } as const;
  const idsIn = async (editionId: string) =>
    (await query<{ id: string }>("select id from listed_recipes where edition_id = $1", [editionId])).map(
      ({ id }) => id,
    );

  test("are shown from three shops on, under ids that no other edition repeats", async () => {
    await makeContributors(owner, 3);
    const two = [await makeContributor(owner, 4, listed), await makeContributor(owner, 5, listed)];
    expect(await idsIn((await build(database)).id)).toEqual([]);
    await makeContributor(owner, 6, listed);
    const [first, second] = [await publishNew(database), await publishNew(database)];
    const ids = [...(await idsIn(first.id)), ...(await idsIn(second.id))];
    expect(ids).toHaveLength(6);
    expect(new Set([...ids, ...two.map(({ recipe }) => recipe.id)]).size).toBe(8);
  });

  test("carry rounded setpoints, a quarter and no machine trait that fewer than five shops share", async () => {
    await makeContributors(owner, 2);
    for (let i = 0; i < 3; i++)
      await makeContributor(owner, 10 + i, { ...listed, arcVoltageV: 110.3, thicknessMm: 3.18 });
    await query("update machines set dryness = 'desiccant' where id in (select id from machines limit 4)");
    const edition = await build(database);
    const [row] = await query<{ recipe: object }>("select recipe from listed_recipes where edition_id = $1", [
      edition.id,
    ]);
    expect(row?.recipe).toMatchObject({
      thicknessMm: 3.2,
      quarter: "2026-Q3",
      setpoints: { arcVoltageV: 110.5 },
      traits: { startMethod: "contact", dryness: null },
    });
  });
});

describe("a build that does not end well", () => {
  const buildsNow = () => query("select state, message, edition_id from edition_builds order by requested_at desc");

  test("killed half-way it leaves the last edition standing and says so in plain words", async () => {
    await makeContributors(owner, 5);
    const last = await publishNew(database);
    const superuser = openDatabase(database.superuserUrl, { max: 1 });
    const result = await runDirectBuild(builderOf(database), {
      onProgress: async () => {
        await superuser.pool.query(
          "select pg_terminate_backend(pid) from pg_stat_activity where usename = 'edition_builder' and datname = current_database() and backend_xmin is not null and state <> 'idle'",
        );
      },
    });
    await superuser.close();
    expect(result).toMatchObject({
      outcome: "failed",
      message: expect.stringMatching(/cut short.*last edition stands/),
    });
    expect(await query("select id, state from editions")).toEqual([{ id: last.id, state: "published" }]);
    expect((await buildsNow())[0]).toMatchObject({ state: "failed", edition_id: null });
  });

  test("told to stop it keeps nothing of itself", async () => {
    await makeContributors(owner, 5);
    const stop = new AbortController();
    const result = await runDirectBuild(builderOf(database), { signal: stop.signal, onProgress: () => stop.abort() });
    expect(result).toMatchObject({ outcome: "failed", message: expect.stringContaining("stopped") });
    expect(await query("select 1 from editions")).toEqual([]);
    expect((await buildsNow())[0]).toMatchObject({ state: "failed" });
  });

  test("a build whose process vanished is closed by the next one", async () => {
    await query("insert into edition_builds (state) values ('running')");
    await makeContributors(owner, 5);
    const next = await build(database);
    expect(await buildsNow()).toEqual([
      { state: "done", message: "", edition_id: next.id },
      { state: "failed", message: expect.stringContaining("cut short"), edition_id: null },
    ]);
  });

  test("a second one at the same time is refused", async () => {
    await makeContributors(owner, 5);
    let second: unknown;
    await build(database, {
      onProgress: async () => {
        second ??= await runDirectBuild(builderOf(database));
      },
    });
    expect(second).toEqual({ outcome: "busy" });
    expect(await query("select 1 from editions")).toHaveLength(1);
  });

  test("nothing queued is nothing to do", async () => {
    expect(await runQueuedBuild(builderOf(database))).toEqual({ outcome: "idle" });
  });
});
