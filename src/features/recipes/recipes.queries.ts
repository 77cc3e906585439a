import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import {
  changeRecipe,
  createRecipe,
  listRecipes,
  listRecipeVersions,
  type Recipe,
  type RecipeContent,
  type RecipeQuery,
  restoreRecipe,
  retireRecipe,
} from "#shared/contracts/recipes.ts";
import { call } from "../../lib/api.ts";
import { recipeQuery, recipesKey } from "../../lib/recipe-queries.ts";

export type RecipeListInput = z.input<typeof RecipeQuery>;

/** A page of the book. The page before stays in sight while the next is on its way, so that the table does not jump. */
export const recipesQuery = (query: RecipeListInput) =>
  queryOptions({
    queryKey: [...recipesKey, "list", query],
    queryFn: ({ signal }) => call(listRecipes, { query }, signal),
    placeholderData: keepPreviousData,
  });

export const recipeVersionsQuery = (id: string) =>
  queryOptions({
    queryKey: [...recipesKey, id, "versions"],
    queryFn: ({ signal }) => call(listRecipeVersions, { params: { id } }, signal),
  });

/** What the server answered is the newest there is; everything else kept about recipes is asked for anew. */
function useTakeIn() {
  const queries = useQueryClient();
  return async (recipe: Recipe) => {
    await queries.invalidateQueries({ queryKey: recipesKey });
    queries.setQueryData(recipeQuery(recipe.id).queryKey, recipe);
  };
}

export function useCreateRecipe() {
  return useMutation({
    mutationFn: ({ content, key }: { content: RecipeContent; key: string }) =>
      call(createRecipe, { body: { content }, idempotencyKey: key }),
    onSuccess: useTakeIn(),
  });
}

export interface RecipeChange {
  content: RecipeContent;
  reason: string;
  /** The version the change started from. */
  baseVersion: number;
}

export function useChangeRecipe(id: string) {
  return useMutation({
    mutationFn: (body: RecipeChange) => call(changeRecipe, { params: { id }, body }),
    onSuccess: useTakeIn(),
  });
}

export function useRetireRecipe(id: string) {
  return useMutation({ mutationFn: () => call(retireRecipe, { params: { id } }), onSuccess: useTakeIn() });
}

export function useRestoreRecipe(id: string) {
  return useMutation({ mutationFn: () => call(restoreRecipe, { params: { id } }), onSuccess: useTakeIn() });
}
