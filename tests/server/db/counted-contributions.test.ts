import { eq } from "drizzle-orm";
import { afterAll, expect, test } from "vitest";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { peerGroupOf } from "#shared/peers/peer-group.ts";
import { openTestDatabase } from "../../support/database.ts";
import { makeMachine, makeRecipe, makeStaffedShop } from "../../support/factories.ts";

const { owner, builder, close } = await openTestDatabase();

afterAll(close);

async function makeShared(values: Parameters<typeof makeRecipe>[3] = {}) {
  const { shop } = await makeStaffedShop(owner);
  const machine = await makeMachine(owner, shop.id);
  return makeRecipe(owner, shop.id, machine.id, { proven: true, share: "counted", ...values });
}

const counted = async (feedMmMin: number) =>
  (await builder.pool.query("select * from counted_contributions where feed_mm_min = $1", [feedMmMin])).rows;

test("a change of the note alone keeps the cuts behind a contribution", async () => {
  const { recipe, version } = await makeShared({ feedMmMin: 2001 });
  const before = await counted(2001);
  await owner.db.insert(recipeVersions).values({ ...version, number: 2, note: "hung up by the table" });
  await owner.db.update(recipes).set({ currentVersion: 2 }).where(eq(recipes.id, recipe.id));
  expect(before).toMatchObject([{ test_cuts: 1, accepted_cuts: 1 }]);
  expect(await counted(2001)).toEqual(before);
});

test.each([
  [0.85, 3],
  [2.55, 3.18],
  [0.8, 2.818],
  [0.8, 2.82],
  [0.8, 5.62],
  [0.8, 5.63],
])(
  "a %d mm nozzle on %d mm sheet is grouped alike by the database and by the product",
  async (nozzleMm, thicknessMm) => {
    const feedMmMin = 3000 + nozzleMm * 100 + thicknessMm;
    await makeShared({ nozzleMm, thicknessMm, feedMmMin });
    const key = peerGroupOf({ material: "mild-steel", thicknessMm, nozzleMm, gas: "air" });
    const rows = await counted(feedMmMin);
    expect(rows).toMatchObject([{ band_index: key.bandIndex, nozzle_mm: key.nozzleMm }]);
  },
);
