import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import { getRecipe, lockRecipe, proveVersion } from "#server/features/recipes/recipes.service.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { readCursor, takePage } from "#server/http/cursor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { listTestCuts as listContract, TestCut, TestCutInput } from "#shared/contracts/test-cuts.ts";
import { perpendicularityRange, roughnessRange } from "#shared/cut-quality/iso9013.ts";
import * as queries from "./test-cuts.queries.ts";

/** A phone's clock may run ahead of the server's by this much, ms. */
const clockTolerance = 5 * 60_000;
/** A date before it is a slip of the finger (0206 for 2026), and PostgreSQL does not know every one of them. */
const earliestCut = new Date("1970-01-01T00:00:00Z");

function present({ cut, recordedBy, place: _, ...version }: queries.TestCutRow): TestCut {
  const { shopId: __, recordedAt: ___, ...row } = cut;
  const { thicknessMm } = version;
  return {
    ...row,
    ...version,
    cutAt: row.cutAt.toISOString(),
    uRange: row.uMm === null ? null : perpendicularityRange(row.uMm, thicknessMm),
    rz5Range: row.rz5Um === null ? null : roughnessRange(row.rz5Um, thicknessMm),
    recordedBy: recordedBy ?? "",
  };
}

/**
 * Keeps what an operator saw and measured. An acceptable cut proves the version it was cut with; one that is not
 * acceptable takes nothing back, for a worn nozzle or a wet line spoils a cut with sound setpoints too.
 */
export async function recordTestCut(
  tx: Db,
  actor: ShopActor,
  recipeId: string,
  input: TestCutInput,
  now: Date,
): Promise<TestCut> {
  const recipe = await lockRecipe(tx, actor, recipeId);
  if (recipe.state === "retired") {
    throw new ProblemError("wrong-state", { detail: "A retired recipe takes no test cuts. Bring it back first" });
  }
  if (input.versionNumber > recipe.currentVersion) {
    const detail = `The recipe has versions 1 to ${recipe.currentVersion}`;
    throw new ProblemError("invalid-request", { errors: [{ pointer: "/versionNumber", detail }] });
  }
  const cutAt = requirePlausibleTime(input.cutAt, now);
  const id = await queries.insertTestCut(tx, actor.shopId, { ...input, recipeId, cutAt, recordedBy: actor.userId });
  if (input.acceptable) await proveVersion(tx, actor, recipe, input.versionNumber, cutAt);
  const row = await queries.findTestCut(tx, actor.shopId, id);
  return present(row!); // written above in this transaction
}

function requirePlausibleTime(text: string, now: Date): Date {
  const cutAt = new Date(text);
  const refuse = (detail: string) => new ProblemError("invalid-request", { errors: [{ pointer: "/cutAt", detail }] });
  if (cutAt.getTime() > now.getTime() + clockTolerance) throw refuse("A test cut cannot lie in the future");
  if (cutAt < earliestCut) throw refuse("The year must be 1970 or later");
  return cutAt;
}

export async function listRecipeTestCuts(tx: Db, actor: ShopActor, recipeId: string): Promise<TestCut[]> {
  const { id } = await getRecipe(tx, actor, recipeId);
  return (await queries.listTestCutsOfRecipe(tx, actor.shopId, id)).map(present);
}

export async function listTestCuts(
  tx: Db,
  actor: ShopActor,
  { cursor, limit, material, acceptable }: z.output<typeof listContract.query>,
): Promise<z.input<typeof listContract.response>> {
  const name = "test-cuts newest";
  const types = queries.newestFirst.map(({ type }) => type);
  const after = readCursor(cursor, name, types);
  const filter = { material, acceptable: acceptable && acceptable === "yes" };
  const rows = await queries.listTestCuts(tx, actor.shopId, filter, { after, limit: limit + 1 });
  const { shown, next } = takePage(rows, limit, name);
  return {
    items: shown.map(present),
    next,
    total: await queries.countTestCuts(tx, actor.shopId, filter),
  };
}
