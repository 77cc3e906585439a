import { z } from "zod";
import { materials } from "../materials/materials.ts";
import { defineEndpoint, IdParams, PageQuery, pageOf } from "./endpoint.ts";

export const drossAmounts = ["none", "light", "moderate", "heavy"] as const;
export const topEdges = ["square", "slightly-rounded", "rounded", "melted"] as const;
export const topEdgeLabels: Record<(typeof topEdges)[number], string> = {
  square: "Square",
  "slightly-rounded": "Slightly rounded",
  rounded: "Rounded",
  melted: "Melted over",
};

/** One cut made to try a recipe, as the operator saw and measured it. */
export const TestCutInput = z
  .object({
    versionNumber: z.number().int().min(1).describe("The recipe version that was cut"),
    cutAt: z.iso.datetime({ offset: true }),
    cutThrough: z.boolean(),
    dross: z.enum(drossAmounts),
    topEdge: z.enum(topEdges),
    bevelDeg: z
      .number()
      .min(-45)
      .max(45)
      .nullable()
      .describe("Degrees; positive when the top is narrower than the bottom"),
    kerfWidthMm: z.number().min(0.3).max(6).nullable(),
    uMm: z.number().min(0).max(20).nullable().describe("Perpendicularity or angularity tolerance u of ISO 9013, mm"),
    rz5Um: z.number().min(0).max(2000).nullable().describe("Mean height of the profile Rz5 of ISO 9013, micrometres"),
    acceptable: z.boolean(),
    note: z.string().trim().max(2000).default(""),
  })
  .check(
    z.refine((cut) => cut.cutThrough || !cut.acceptable, {
      path: ["acceptable"],
      error: "A cut that did not go through cannot be acceptable",
    }),
  );
export type TestCutInput = z.infer<typeof TestCutInput>;

const Iso9013Range = z.union([z.number().int(), z.literal("outside")]).nullable();

export const TestCut = z.object({
  id: z.uuid(),
  recipeId: z.uuid(),
  versionNumber: z.number().int(),
  material: z.enum(materials),
  thicknessMm: z.number(),
  nozzleMm: z.number(),
  machineName: z.string(),
  cutAt: z.iso.datetime(),
  cutThrough: z.boolean(),
  dross: z.enum(drossAmounts),
  topEdge: z.enum(topEdges),
  bevelDeg: z.number().nullable(),
  kerfWidthMm: z.number().nullable(),
  uMm: z.number().nullable(),
  rz5Um: z.number().nullable(),
  uRange: Iso9013Range,
  rz5Range: Iso9013Range,
  acceptable: z.boolean(),
  note: z.string(),
  recordedBy: z.string(),
});
export type TestCut = z.infer<typeof TestCut>;

export const recordTestCut = defineEndpoint({
  method: "post",
  path: "/api/recipes/:id/test-cuts",
  summary: "Record a test cut; an acceptable one proves the version it was cut with",
  access: "operator",
  params: IdParams,
  body: TestCutInput,
  response: TestCut,
  status: 201,
  problems: ["not-found", "wrong-state"],
});

export const listRecipeTestCuts = defineEndpoint({
  method: "get",
  path: "/api/recipes/:id/test-cuts",
  summary: "A recipe's test cuts, newest first",
  access: "operator",
  params: IdParams,
  response: z.object({ items: z.array(TestCut) }),
  problems: ["not-found"],
});

export const listTestCuts = defineEndpoint({
  method: "get",
  path: "/api/test-cuts",
  summary: "The shop's test cuts, newest first, a page at a time",
  access: "operator",
  query: PageQuery.extend({
    material: z.enum(materials).optional(),
    acceptable: z.enum(["yes", "no"]).optional(),
  }),
  response: pageOf(TestCut),
});
