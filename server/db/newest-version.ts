import { and, eq } from "drizzle-orm";
import { recipeVersions } from "./schema/recipe-versions.ts";
import { recipes } from "./schema/recipes.ts";

/** Joins each recipe with its newest version alone. */
export const isNewestVersion = and(
  eq(recipeVersions.recipeId, recipes.id),
  eq(recipeVersions.number, recipes.currentVersion),
);
