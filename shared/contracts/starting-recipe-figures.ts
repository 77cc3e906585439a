import { z } from "zod";
import { materials, processGases } from "../materials/materials.ts";
import { forEachMetric, metrics } from "../recipes/metrics.ts";
import { EditionRef } from "./released-figures.ts";

/** What a setpoint's value stands on, best first. */
export const bases = ["peers", "neighbours", "practice", "none"] as const;
export const basisLabels: Record<(typeof bases)[number], string> = {
  peers: "Peers",
  neighbours: "Neighbouring groups",
  practice: "Common practice",
  none: "To be found by test",
};

/** One thing done on the way to a value, in the order done. */
export const EstimateStep = z.object({
  kind: z.enum(["figures", "thickness", "offset", "range", "practice", "limit", "test"]),
  text: z.string(),
});
export type EstimateStep = z.infer<typeof EstimateStep>;

export const StartingSetpoint = z.object({
  value: z.number().nullable().describe("Stored unit, rounded as released figures are"),
  low: z.number().nullable(),
  high: z.number().nullable(),
  basis: z.enum(bases),
  evidence: z.string().describe("What the value stands on, in one line"),
  steps: z.array(EstimateStep),
});
export type StartingSetpoint = z.infer<typeof StartingSetpoint>;

export const NozzleAdvice = z.object({
  nozzleMm: z.number().nullable().describe("Null where neither peers nor practice know one"),
  chosenBy: z.enum(["shop", "peers", "practice", "nobody"]),
  reason: z.string(),
});
export type NozzleAdvice = z.infer<typeof NozzleAdvice>;

/** A limit of the machine that moved a setpoint. */
export const LimitHit = z.object({
  limit: z.enum(["power-source-current", "top-feed", "torch-pressure"]),
  metric: z.enum(metrics),
  wanted: z.number().describe("What the recipe would have been without the limit, stored unit"),
  given: z.number(),
  text: z.string(),
});
export type LimitHit = z.infer<typeof LimitHit>;

export const StartingHeatCheck = z
  .object({
    meltPowerW: z.number(),
    arcPowerW: z.number(),
    ratio: z.number().describe("Power to melt the kerf over arc power: above 1 cannot be"),
    verdict: z.string(),
    words: z.string(),
  })
  .describe("Null in a starting recipe that lacks feed, kerf, current or arc voltage");
export type StartingHeatCheck = z.infer<typeof StartingHeatCheck>;

export const Caution = z.object({
  id: z.string(),
  title: z.string(),
  text: z.string(),
  standards: z.array(z.string()).describe("By number only"),
});
export type Caution = z.infer<typeof Caution>;

export const TestPlanStep = z.object({
  order: z.number().int().positive(),
  title: z.string(),
  varies: z.enum(metrics).nullable().describe("The one setpoint that changes in this step"),
  levels: z
    .array(z.number())
    .describe("Values to cut at in this order, stored unit; empty where the step says how to go on"),
  coupons: z.number().int().min(0),
  instruction: z.string(),
  keepWhen: z.string().describe("What to see before going on"),
});
export type TestPlanStep = z.infer<typeof TestPlanStep>;

/** A starting recipe as shown, exported and kept. `schemaVersion` goes up with any change a reader would stumble over. */
export const StartingRecipe = z.object({
  schemaVersion: z.literal(1),
  units: z.literal("Each field's name ends in its unit: A, bar gauge, mm/min, mm, s, V"),
  material: z.enum(materials),
  thicknessMm: z.number(),
  gas: z.enum(processGases),
  edition: EditionRef.nullable().describe("The edition its peers' figures come from; null where it uses none"),
  groupId: z.string().nullable(),
  nozzle: NozzleAdvice,
  setpoints: z.object(forEachMetric(() => StartingSetpoint)),
  limits: z.array(LimitHit),
  heatCheck: StartingHeatCheck.nullable(),
  cautions: z.array(Caution),
  testPlan: z.array(TestPlanStep),
});
export type StartingRecipe = z.infer<typeof StartingRecipe>;
