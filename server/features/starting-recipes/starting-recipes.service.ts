import type { Db } from "#server/db/client.ts";
import { readCurrentMaterial } from "#server/features/editions/editions.service.ts";
import { requireMachine } from "#server/features/machines/machines.service.ts";
import { createRecipe } from "#server/features/recipes/recipes.service.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Recipe, RecipeContent, RecipeOrigin } from "#shared/contracts/recipes.ts";
import type { StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import type { StartingRecipeQuery } from "#shared/contracts/starting-recipes.ts";
import { forEachMetric } from "#shared/recipes/metrics.ts";
import { startingRecipe } from "#shared/recipes/starting-recipe.ts";

/** From the shop's machine and the current edition alone. */
export async function getStartingRecipe(tx: Db, actor: ShopActor, query: StartingRecipeQuery): Promise<StartingRecipe> {
  const { material, gas, thicknessMm, nozzleMm, machineId } = query;
  const machine = await requireMachine(tx, actor, machineId);
  const released = await readCurrentMaterial(tx, material, gas);
  const recipe = startingRecipe({
    ...{ material, gas, thicknessMm, machine, units: actor.units },
    nozzleMm: nozzleMm ?? null,
    groups: released?.groups ?? [],
    network: released?.network ?? null,
  });
  const edition = released && { number: released.edition.number, date: released.edition.date };
  return { ...recipe, edition };
}

/** Kept as a draft that knows what each first value stood on. */
export async function saveStartingRecipe(tx: Db, actor: ShopActor, query: StartingRecipeQuery): Promise<Recipe> {
  const recipe = await getStartingRecipe(tx, actor, query);
  const origin: RecipeOrigin = {
    kind: "starting-recipe",
    editionNumber: recipe.edition?.number ?? null,
    basis: forEachMetric((metric) => recipe.setpoints[metric].basis),
  };
  return createRecipe(tx, actor, { content: contentOf(recipe, query.machineId), reason: "" }, origin);
}

function contentOf(recipe: StartingRecipe, machineId: string): RecipeContent {
  const { nozzleMm } = recipe.nozzle;
  if (nozzleMm === null) {
    const errors = [{ pointer: "/nozzleMm", detail: "Nobody knows a nozzle for this: choose one" }];
    throw new ProblemError("invalid-request", { errors });
  }
  return {
    machineId,
    material: recipe.material,
    grade: "",
    surface: "clean",
    processGas: recipe.gas,
    thicknessMm: recipe.thicknessMm,
    nozzleMm,
    setpoints: forEachMetric((metric) => recipe.setpoints[metric].value),
    note: "",
  };
}
