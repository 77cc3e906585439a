import { z } from "zod";
import { materials, processGases, surfaces } from "../materials/materials.ts";
import { metricDefinitions, nozzleRangeMm, thicknessRangeMm } from "../recipes/metrics.ts";
import { bookFiles } from "./book-files.ts";
import { defineEndpoint, IdParams, PageQuery, pageOf } from "./endpoint.ts";

export const recipeStates = ["draft", "proven", "retired"] as const;
export const sharingLevels = ["private", "counted", "listed"] as const;
export type RecipeState = (typeof recipeStates)[number];
export type SharingLevel = (typeof sharingLevels)[number];

const setpoint = (metric: keyof typeof metricDefinitions) =>
  z.number().min(metricDefinitions[metric].hard.min).max(metricDefinitions[metric].hard.max).nullable();

/** The eight setpoints in stored units, each null where the shop has not filled it in. */
export const SetpointValues = z.object({
  currentA: setpoint("currentA"),
  pressureBar: setpoint("pressureBar"),
  feedMmMin: setpoint("feedMmMin"),
  cutHeightMm: setpoint("cutHeightMm"),
  pierceHeightMm: setpoint("pierceHeightMm"),
  pierceDelayS: setpoint("pierceDelayS"),
  arcVoltageV: setpoint("arcVoltageV"),
  kerfWidthMm: setpoint("kerfWidthMm"),
});
export type SetpointValues = z.infer<typeof SetpointValues>;

/** What a recipe cuts and with what: together with the gas this decides its peer group. */
export const RecipeSubject = z.object({
  machineId: z.uuid(),
  material: z.enum(materials),
  grade: z.string().trim().max(60).default(""),
  surface: z.enum(surfaces),
  processGas: z.enum(processGases),
  thicknessMm: z.number().min(thicknessRangeMm.min).max(thicknessRangeMm.max),
  nozzleMm: z.number().min(nozzleRangeMm.min).max(nozzleRangeMm.max),
});

export const RecipeContent = RecipeSubject.extend({
  setpoints: SetpointValues,
  note: z.string().trim().max(2000).default("").describe("Note to self: private to the shop, never shared"),
}).check(
  z.refine(
    ({ setpoints: s }) => s.pierceHeightMm === null || s.cutHeightMm === null || s.pierceHeightMm >= s.cutHeightMm,
    {
      path: ["setpoints", "pierceHeightMm"],
      error: "Pierce height cannot be below cut height",
    },
  ),
);
export type RecipeContent = z.infer<typeof RecipeContent>;

/** Where a recipe came from, kept with the version that began it. */
export const RecipeOrigin = z.object({
  kind: z.enum(["typed", "starting-recipe", "listed-recipe"]),
  editionNumber: z.number().int().nullable(),
  basis: z.record(z.string(), z.string()).describe("Setpoint → the basis its first value stood on"),
});
export type RecipeOrigin = z.infer<typeof RecipeOrigin>;

export const RecipeVersion = z.object({
  number: z.number().int(),
  content: RecipeContent,
  reason: z.string(),
  changedBy: z.string().describe("Name of the person of this shop who saved it; empty when they have left"),
  changedAt: z.iso.datetime(),
  proven: z.boolean().describe("An acceptable test cut belongs to this version"),
  origin: RecipeOrigin,
});
export type RecipeVersion = z.infer<typeof RecipeVersion>;

export const Recipe = z.object({
  id: z.uuid(),
  machineName: z.string(),
  state: z.enum(recipeStates),
  sharing: z.enum(sharingLevels),
  testCuts: z.number().int().describe("Of all its versions"),
  acceptableTestCuts: z.number().int().describe("Of all its versions"),
  version: RecipeVersion,
});
export type Recipe = z.infer<typeof Recipe>;

export const recipeSorts = [
  "changed",
  "material",
  "thickness",
  "nozzle",
  "machine",
  "current",
  "feed",
  "voltage",
  "pressure",
] as const;

export const RecipeQuery = PageQuery.extend({
  search: z.string().trim().max(100).optional().describe("Words in grade, note, machine name or material"),
  material: z.enum(materials).optional(),
  machineId: z.uuid().optional(),
  state: z.enum(recipeStates).optional(),
  sharing: z.enum(sharingLevels).optional(),
  thicknessMm: z.coerce
    .number()
    .min(thicknessRangeMm.min)
    .max(thicknessRangeMm.max)
    .optional()
    .describe("Recipes of its R10 thickness band"),
  nozzleMm: z.coerce.number().min(nozzleRangeMm.min).max(nozzleRangeMm.max).optional(),
  sort: z.enum(recipeSorts).default("changed"),
  order: z.enum(["asc", "desc"]).default("desc"),
});
export type RecipeQuery = z.infer<typeof RecipeQuery>;

const Reason = z.string().trim().max(300).default("");

export const listRecipes = defineEndpoint({
  method: "get",
  path: "/api/recipes",
  summary: "The shop's recipes, filtered, sorted, a page at a time",
  access: "operator",
  query: RecipeQuery,
  response: pageOf(Recipe),
});

export const getRecipe = defineEndpoint({
  method: "get",
  path: "/api/recipes/:id",
  summary: "One recipe as it stands",
  access: "operator",
  params: IdParams,
  response: Recipe,
  problems: ["not-found"],
});

export const createRecipe = defineEndpoint({
  method: "post",
  path: "/api/recipes",
  summary: "Keep a new recipe as a draft",
  access: "operator",
  body: z.object({ content: RecipeContent, reason: Reason }),
  response: Recipe,
  status: 201,
  problems: ["not-found"],
});

export const changeRecipe = defineEndpoint({
  method: "put",
  path: "/api/recipes/:id",
  summary:
    "Save a new version; refused with the newest when it is not the one this started from; content it holds already makes none",
  access: "operator",
  params: IdParams,
  body: z.object({ content: RecipeContent, reason: Reason, baseVersion: z.number().int() }),
  response: Recipe,
  problems: ["not-found", "stale-version", "wrong-state"],
});

export const retireRecipe = defineEndpoint({
  method: "post",
  path: "/api/recipes/:id/retirement",
  summary: "Retire a recipe: kept to read, no longer offered or shared",
  access: "owner",
  params: IdParams,
  response: Recipe,
  problems: ["not-found", "wrong-state"],
});

export const restoreRecipe = defineEndpoint({
  method: "delete",
  path: "/api/recipes/:id/retirement",
  summary: "Bring a retired recipe back",
  access: "owner",
  params: IdParams,
  response: Recipe,
  problems: ["not-found", "wrong-state"],
});

export const listRecipeVersions = defineEndpoint({
  method: "get",
  path: "/api/recipes/:id/versions",
  summary: "Every version of a recipe, newest first, with who, when and why",
  access: "operator",
  params: IdParams,
  response: z.object({ items: z.array(RecipeVersion) }),
  problems: ["not-found"],
});

/** The whole book in one documented shape; a shop can take it away at any time. */
export const BookExport = z.object({
  schemaVersion: z.literal(1),
  exportedAt: z.iso.datetime(),
  units: z.literal("Each field's name ends in its unit: A, bar gauge, mm/min, mm, s, V"),
  recipes: z.array(Recipe.extend({ versions: z.array(RecipeVersion) })),
});
export type BookExport = z.infer<typeof BookExport>;

export const exportBookJson = defineEndpoint({
  method: "get",
  path: bookFiles.json,
  summary: "The shop's book with every version, as JSON",
  access: "operator",
  response: BookExport,
});

export const exportBookCsv = defineEndpoint({
  method: "get",
  path: bookFiles.csv,
  summary: "The shop's book as it stands, as CSV (RFC 4180), stored units",
  access: "operator",
  response: z.string(),
  mediaType: "text/csv",
});
