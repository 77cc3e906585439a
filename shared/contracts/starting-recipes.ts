import { z } from "zod";
import { materials, processGases } from "../materials/materials.ts";
import { nozzleRangeMm, thicknessRangeMm } from "../recipes/metrics.ts";
import { defineEndpoint } from "./endpoint.ts";
import { Recipe } from "./recipes.ts";
import { StartingRecipe } from "./starting-recipe-figures.ts";

export const StartingRecipeQuery = z.object({
  material: z.enum(materials),
  gas: z.enum(processGases).default("air"),
  thicknessMm: z.coerce.number().min(thicknessRangeMm.min).max(thicknessRangeMm.max),
  nozzleMm: z.coerce.number().min(nozzleRangeMm.min).max(nozzleRangeMm.max).optional().describe("Left out: advise one"),
  machineId: z.uuid(),
});
export type StartingRecipeQuery = z.infer<typeof StartingRecipeQuery>;

export const getStartingRecipe = defineEndpoint({
  method: "get",
  path: "/api/starting-recipes",
  summary: "A starting recipe for a metal, fitted to one of the shop's machines",
  access: "operator",
  query: StartingRecipeQuery,
  response: StartingRecipe,
  problems: ["not-found"],
});

export const getStartingRecipeCsv = defineEndpoint({
  method: "get",
  path: "/api/starting-recipes.csv",
  summary: "The same starting recipe as CSV (RFC 4180), one setpoint a row, stored units",
  access: "operator",
  query: StartingRecipeQuery,
  response: z.string(),
  mediaType: "text/csv",
  problems: ["not-found"],
});

export const saveStartingRecipe = defineEndpoint({
  method: "post",
  path: "/api/starting-recipes",
  summary: "Keep a starting recipe in the book as a draft, with its origin",
  access: "operator",
  body: StartingRecipeQuery.extend({
    thicknessMm: z.number().min(thicknessRangeMm.min).max(thicknessRangeMm.max),
    nozzleMm: z.number().min(nozzleRangeMm.min).max(nozzleRangeMm.max).optional(),
  }),
  response: Recipe,
  status: 201,
  problems: ["not-found"],
});
