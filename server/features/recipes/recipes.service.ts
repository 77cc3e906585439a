import type { z } from "zod";
import { type Db, violates } from "#server/db/client.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type {
  changeRecipe as changeContract,
  createRecipe as createContract,
  Recipe,
  RecipeOrigin,
  RecipeVersion,
} from "#shared/contracts/recipes.ts";
import { columnsOf, contentOf, isSameContent, isSameCut, presentRecipe, presentVersion } from "./recipe-content.ts";
import * as queries from "./recipes.queries.ts";

const typed: RecipeOrigin = { kind: "typed", editionNumber: null, basis: {} };

export async function getRecipe(tx: Db, actor: ShopActor, id: string): Promise<Recipe> {
  const row = await queries.findRecipe(tx, actor.shopId, id);
  if (!row) throw unknownRecipe();
  return presentRecipe(row);
}

/** The whole book, retired recipes too, ordered as a person looks things up. */
export async function listBook(tx: Db, actor: ShopActor): Promise<Recipe[]> {
  return (await queries.listBook(tx, actor.shopId)).map(presentRecipe);
}

export async function listRecipeVersions(tx: Db, actor: ShopActor, id: string): Promise<RecipeVersion[]> {
  const rows = await queries.listVersions(tx, actor.shopId, id);
  if (rows.length === 0) throw unknownRecipe();
  return rows.map(({ version, changedBy }) => presentVersion(version, changedBy));
}

export async function createRecipe(
  tx: Db,
  actor: ShopActor,
  { content, reason }: z.output<typeof createContract.body>,
  origin: RecipeOrigin = typed,
): Promise<Recipe> {
  const recipeId = await queries.insertRecipe(tx, actor.shopId);
  await addVersion(tx, actor, { recipeId, number: 1, reason, origin, ...columnsOf(content) });
  return getRecipe(tx, actor, recipeId);
}

/**
 * Appends a version. Content the book holds already changes nothing and makes none, so a change sent again after its
 * answer was lost is no conflict. A changed note alone keeps the proof, for the cut is the same; anything else makes a
 * proven recipe a draft again, which counts nowhere until an acceptable test cut proves the new version.
 */
export async function changeRecipe(
  tx: Db,
  actor: ShopActor,
  id: string,
  { content, reason, baseVersion }: z.output<typeof changeContract.body>,
): Promise<Recipe> {
  const recipe = await lockRecipe(tx, actor, id);
  if (recipe.state === "retired") {
    throw new ProblemError("wrong-state", { detail: "A retired recipe cannot be changed. Bring it back first" });
  }
  const newest = await requireNewest(tx, actor, recipe);
  const before = contentOf(newest);
  if (isSameContent(before, content)) return getRecipe(tx, actor, id);
  if (baseVersion !== newest.number) {
    throw new ProblemError("stale-version", { current: await getRecipe(tx, actor, id) });
  }
  const provenAt = isSameCut(before, content) ? newest.provenAt : null;
  const number = newest.number + 1;
  await addVersion(tx, actor, {
    ...{ recipeId: id, number, reason, origin: newest.origin, provenAt },
    ...columnsOf(content),
  });
  await queries.pointToVersion(tx, actor.shopId, { id, state: provenAt ? "proven" : "draft", currentVersion: number });
  return getRecipe(tx, actor, id);
}

/** A retired recipe leaves the next edition; the level it was shared at is kept for when it comes back. */
export async function retireRecipe(tx: Db, actor: ShopActor, id: string): Promise<Recipe> {
  const recipe = await lockRecipe(tx, actor, id);
  if (recipe.state === "retired") throw new ProblemError("wrong-state", { detail: "The recipe is retired already" });
  await queries.updateState(tx, actor.shopId, id, "retired");
  return getRecipe(tx, actor, id);
}

export async function restoreRecipe(tx: Db, actor: ShopActor, id: string): Promise<Recipe> {
  const recipe = await lockRecipe(tx, actor, id);
  if (recipe.state !== "retired") throw new ProblemError("wrong-state", { detail: "The recipe is not retired" });
  const { provenAt } = await requireNewest(tx, actor, recipe);
  await queries.updateState(tx, actor.shopId, id, provenAt ? "proven" : "draft");
  return getRecipe(tx, actor, id);
}

/** One of the shop's own recipes, held until the transaction ends; any other id does not exist for it. */
export async function lockRecipe(tx: Db, actor: ShopActor, id: string): Promise<queries.LockedRecipe> {
  const recipe = await queries.lockRecipe(tx, actor.shopId, id);
  if (!recipe) throw unknownRecipe();
  return recipe;
}

/**
 * Takes an acceptable test cut as proof of the version it was cut with, and of the versions right after it that cut the
 * same: a note changed while somebody stood at the table costs no proof. The recipe is proven once its newest version is.
 */
export async function proveVersion(
  tx: Db,
  actor: ShopActor,
  recipe: queries.LockedRecipe,
  number: number,
  provenAt: Date,
): Promise<void> {
  const versions = (await queries.listVersions(tx, actor.shopId, recipe.id)).map(({ version }) => version);
  const onwards = versions.filter((version) => version.number >= number).reverse();
  const changed = onwards.findIndex((version) => !isSameCut(contentOf(version), contentOf(onwards[0]!))); // at least the cut one
  const numbers = (changed < 0 ? onwards : onwards.slice(0, changed)).map((version) => version.number);
  await queries.markProven(tx, actor.shopId, recipe.id, numbers, provenAt);
  if (numbers.includes(recipe.currentVersion)) await queries.updateState(tx, actor.shopId, recipe.id, "proven");
}

async function requireNewest(tx: Db, actor: ShopActor, recipe: queries.LockedRecipe): Promise<queries.VersionRow> {
  const row = await queries.findVersion(tx, actor.shopId, recipe.id, recipe.currentVersion);
  return row!; // a recipe points at a version of its own, written in the same transaction
}

/** The machine must be one of the shop: said at the field, in the words for one that does not exist. */
async function addVersion(tx: Db, actor: ShopActor, values: queries.NewVersion): Promise<void> {
  try {
    await queries.insertVersion(tx, actor.shopId, { ...values, changedBy: actor.userId });
  } catch (error) {
    if (!violates(error, "recipe_versions_machine")) throw error;
    const errors = [{ pointer: "/content/machineId", detail: "This shop has no such machine" }];
    throw new ProblemError("invalid-request", { errors });
  }
}

function unknownRecipe(): ProblemError {
  return new ProblemError("not-found", { detail: "This shop has no such recipe" });
}
