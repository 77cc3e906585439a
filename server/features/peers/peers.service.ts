import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import { readCurrentGroups } from "#server/features/editions/editions.service.ts";
import { listBook } from "#server/features/recipes/recipes.service.ts";
import type { ShopActor } from "#server/http/actor.ts";
import type { rankBook as contract } from "#shared/contracts/peers.ts";
import type { RecipeContent } from "#shared/contracts/recipes.ts";
import type { Check, MetricStanding } from "#shared/peers/advice.ts";
import { rankBook as rank } from "#shared/peers/book-ranking.ts";
import { peerGroupId, peerGroupOf } from "#shared/peers/peer-group.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";

type BookRanking = z.input<typeof contract.response>;
type PresentedStanding = BookRanking["ranked"][number]["standings"][number];

/** The shop's own recipes against the current edition: from its own values and released figures, and nothing else. */
export async function rankBook(tx: Db, actor: ShopActor): Promise<BookRanking> {
  const recipes = (await listBook(tx, actor)).filter(({ state }) => state !== "retired");
  const groupIds = new Map(recipes.map((recipe) => [recipe.id, groupIdOf(recipe.version.content)]));
  const { edition, figures } = await readCurrentGroups(tx, [...new Set(groupIds.values())]);
  const byGroup = new Map(figures.map((group) => [peerGroupId(group.key), group]));
  const { ranked, withoutPeers } = rank(
    recipes.map((recipe) => ({
      id: recipe.id,
      setpoints: recipe.version.content.setpoints,
      figures: byGroup.get(groupIds.get(recipe.id)!) ?? null, // every recipe was given one above
      hasAcceptableTestCut: recipe.version.proven,
    })),
  );
  const byId = new Map(recipes.map((recipe) => [recipe.id, recipe]));
  return {
    edition,
    withoutPeers: withoutPeers.length,
    ranked: ranked.map(({ id, standings, checks }) => ({
      recipe: byId.get(id)!, // the ranking gives back the ids it was given
      groupId: groupIds.get(id)!,
      standings: standings.map(presentStanding),
      checkFirst: checks[0] ? wordsOf(checks[0]) : "",
    })),
  };
}

function groupIdOf({ material, thicknessMm, nozzleMm, processGas: gas }: RecipeContent): string {
  return peerGroupId(peerGroupOf({ material, thicknessMm, nozzleMm, gas }));
}

function presentStanding({ metric, value, standing }: MetricStanding): PresentedStanding {
  const { percentile, robustZ, word } = standing;
  return { metric, value, percentile, robustZ, word };
}

function wordsOf({ metric, standing, usually, verdict }: Check): string {
  return `${metricDefinitions[metric].label} is ${standing.word}: that usually goes with ${usually}. ${verdict}`;
}
