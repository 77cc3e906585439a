import { keepPreviousData, queryOptions, skipToken, useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { changeSharing, getSharing, previewSharing, type SharingInput } from "#shared/contracts/sharing.ts";
import { call } from "../../lib/api.ts";
import { recipesKey } from "../../lib/recipe-queries.ts";

export const sharingQuery = (recipeId: string) =>
  queryOptions({
    queryKey: [...recipesKey, recipeId, "sharing"],
    queryFn: ({ signal }) => call(getSharing, { params: { id: recipeId } }, signal),
  });

/** What others would see with words that are not saved. Undefined words ask nothing. */
export const sharingPreviewQuery = (recipeId: string, publicText: string | undefined) =>
  queryOptions({
    queryKey: [...recipesKey, recipeId, "sharing", "preview", publicText],
    queryFn:
      publicText === undefined
        ? skipToken
        : ({ signal }) =>
            call(previewSharing, { params: { id: recipeId }, body: { level: "listed", publicText } }, signal),
    placeholderData: keepPreviousData,
  });

export function useChangeSharing(recipeId: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof SharingInput>) => call(changeSharing, { params: { id: recipeId }, body }),
    onSuccess: async (sharing) => {
      queries.setQueryData(sharingQuery(recipeId).queryKey, sharing);
      await queries.invalidateQueries({ queryKey: recipesKey });
    },
  });
}
