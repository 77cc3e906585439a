import { queryOptions } from "@tanstack/react-query";
import { getRecipe } from "#shared/contracts/recipes.ts";
import { call } from "./api.ts";

/** Everything kept about recipes lies below the first key, so one change can freshen all of it. */
export const recipesKey = ["recipes"] as const;

export const recipeQuery = (id: string) =>
  queryOptions({
    queryKey: [...recipesKey, id],
    queryFn: ({ signal }) => call(getRecipe, { params: { id } }, signal),
  });
