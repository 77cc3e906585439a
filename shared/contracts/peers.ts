import { z } from "zod";
import { metrics } from "../recipes/metrics.ts";
import { PublishedEdition } from "./editions.ts";
import { defineEndpoint } from "./endpoint.ts";
import { Recipe } from "./recipes.ts";

export const StandingWord = z.enum(["typical", "high", "low", "unusually high", "unusually low"]);

/** Where one setpoint lies in its peer group, from the released figures and the shop's own value alone. */
export const MetricStanding = z.object({
  metric: z.enum(metrics),
  value: z.number(),
  percentile: z.number().int().nullable(),
  robustZ: z.number(),
  word: StandingWord,
});

export const RankedRecipe = z.object({
  recipe: Recipe,
  groupId: z.string(),
  standings: z.array(MetricStanding).describe("Most unusual first"),
  checkFirst: z.string().describe("What to look at first, in words; empty when nothing stands out"),
});
export type RankedRecipe = z.infer<typeof RankedRecipe>;

export const rankBook = defineEndpoint({
  method: "get",
  path: "/api/peers/book",
  summary: "Own recipes ranked by how far their setpoints lie from their peers, with what to check first",
  access: "operator",
  response: z.object({
    edition: PublishedEdition.nullable(),
    ranked: z.array(RankedRecipe),
    withoutPeers: z.number().int().describe("Own recipes whose peer group is not shown"),
  }),
});
