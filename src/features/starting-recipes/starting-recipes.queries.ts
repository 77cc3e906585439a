import { keepPreviousData, queryOptions, skipToken, useMutation, useQueryClient } from "@tanstack/react-query";
import { useRef } from "react";
import { getStartingRecipe, type StartingRecipeQuery, saveStartingRecipe } from "#shared/contracts/starting-recipes.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { call } from "../../lib/api.ts";
import { randomKey } from "../../lib/random-key.ts";
import { recipesKey } from "../../lib/recipe-queries.ts";

/** The recipe for these answers; the one before stays in sight until the new one is there. Its words name units. */
export const startingRecipeQuery = (query: StartingRecipeQuery | null, units: UnitSystem) =>
  queryOptions({
    queryKey: ["starting-recipes", units, query],
    queryFn: query ? ({ signal }) => call(getStartingRecipe, { query }, signal) : skipToken,
    placeholderData: keepPreviousData,
  });

/** Keeps it in the book as a draft, once however often it is pressed. */
export function useSaveStartingRecipe() {
  const queries = useQueryClient();
  const sent = useRef({ content: "", key: "" });
  return useMutation({
    mutationFn: (body: StartingRecipeQuery) => {
      const content = JSON.stringify(body);
      if (sent.current.content !== content) sent.current = { content, key: randomKey() };
      return call(saveStartingRecipe, { body, idempotencyKey: sent.current.key });
    },
    onSuccess: () => queries.invalidateQueries({ queryKey: recipesKey }),
  });
}
