import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { listRecipeTestCuts, listTestCuts, recordTestCut, type TestCutInput } from "#shared/contracts/test-cuts.ts";
import { call } from "../../lib/api.ts";
import { recipesKey } from "../../lib/recipe-queries.ts";

const testCutsKey = ["test-cuts"] as const;

export const testCutsQuery = (query: z.input<typeof listTestCuts.query>) =>
  queryOptions({
    queryKey: [...testCutsKey, query],
    queryFn: ({ signal }) => call(listTestCuts, { query }, signal),
    placeholderData: keepPreviousData,
  });

export const recipeTestCutsQuery = (recipeId: string) =>
  queryOptions({
    queryKey: [...recipesKey, recipeId, "test-cuts"],
    queryFn: ({ signal }) => call(listRecipeTestCuts, { params: { id: recipeId } }, signal),
  });

/** An acceptable cut may prove its recipe, so that is asked for anew as well. */
export function useRecordTestCut(recipeId: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ cut, key }: { cut: TestCutInput; key: string }) =>
      call(recordTestCut, { params: { id: recipeId }, body: cut, idempotencyKey: key }),
    onSuccess: () =>
      Promise.all([
        queries.invalidateQueries({ queryKey: testCutsKey }),
        queries.invalidateQueries({ queryKey: recipesKey }),
      ]),
  });
}
