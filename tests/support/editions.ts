import type { Database } from "#server/db/client.ts";
import { openSession } from "#server/db/session.ts";
import { publishEdition } from "#server/features/editions/publication.service.ts";
import { type BuilderSettings, type BuildWatch, runDirectBuild } from "#server/features/editions/run-build.ts";
import type { TestDatabase } from "./database.ts";
import { makeMachine, makeRecipe, makeShop, plainSetpoints } from "./factories.ts";

type RecipeValues = Parameters<typeof makeRecipe>[3];

export function builderOf(database: TestDatabase): BuilderSettings {
  return { url: database.builderUrl, marksKey: "a-key-for-tests-only-0123456789abcdef" };
}

/** Builds an edition as the command does; the test fails when it is not built. */
export async function build(database: TestDatabase, watch: BuildWatch = {}): Promise<{ id: string; number: number }> {
  const result = await runDirectBuild(builderOf(database), watch);
  if (result.outcome !== "done") throw new Error(`not built: ${JSON.stringify(result)}`);
  return { id: result.editionId, number: result.number };
}

/** Builds and publishes as the command does, with no admin. */
export async function publishNew(database: TestDatabase): Promise<{ id: string; number: number }> {
  const edition = await build(database);
  const session = await openSession(database.builderUrl);
  try {
    await session.db.transaction((tx) => publishEdition(tx, { userId: null }, edition.id));
  } finally {
    await session.end();
  }
  return edition;
}

/** A shop that shares one proven recipe; `step` sets its setpoints a little apart from those of the others. */
export async function makeContributor(owner: Pick<Database, "db">, step: number, values: RecipeValues = {}) {
  const shop = await makeShop(owner);
  const machine = await makeMachine(owner, shop.id);
  const { recipe, version } = await makeRecipe(owner, shop.id, machine.id, {
    proven: true,
    share: "counted",
    currentA: plainSetpoints.currentA + (step % 5),
    feedMmMin: plainSetpoints.feedMmMin + 40 * step,
    arcVoltageV: plainSetpoints.arcVoltageV + step,
    ...values,
  });
  return { shop, machine, recipe, version };
}

export async function makeContributors(owner: Pick<Database, "db">, shops: number, values: RecipeValues = {}) {
  const made: Awaited<ReturnType<typeof makeContributor>>[] = [];
  for (let step = 0; step < shops; step++) made.push(await makeContributor(owner, step, values));
  return made;
}
