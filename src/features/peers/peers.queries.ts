import { queryOptions } from "@tanstack/react-query";
import { rankBook } from "#shared/contracts/peers.ts";
import { listRecipes, type Recipe } from "#shared/contracts/recipes.ts";
import type { Material } from "#shared/materials/materials.ts";
import { peerGroupId, peerGroupOf } from "#shared/peers/peer-group.ts";
import { call } from "../../lib/api.ts";
import { recipesKey } from "../../lib/recipe-queries.ts";
import { peerSubjectOf } from "../../lib/recipe-words.ts";

/** The most a page of the book holds. */
const pageSize = 200;

/** Every own recipe of one metal that is in use, whatever its gas: for the marks on the map and in a group. */
export const ownRecipesQuery = (material: Material) =>
  queryOptions({
    queryKey: [...recipesKey, "of-material", material],
    queryFn: async ({ signal }) => {
      const recipes: Recipe[] = [];
      let cursor: string | undefined;
      do {
        const query = { material, limit: pageSize, ...(cursor && { cursor }) };
        const page = await call(listRecipes, { query }, signal);
        recipes.push(...page.items);
        cursor = page.next ?? undefined;
      } while (cursor);
      return recipes.filter(({ state }) => state !== "retired");
    },
  });

export const groupIdOf = ({ version }: Recipe) => peerGroupId(peerGroupOf(peerSubjectOf(version.content)));

/** The book against the newest edition. Below the recipes' key, because any change of a recipe may move it. */
export const bookRankingQuery = queryOptions({
  queryKey: [...recipesKey, "against-peers"],
  queryFn: ({ signal }) => call(rankBook, {}, signal),
});
