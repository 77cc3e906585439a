import { z } from "zod";
import { materials, processGases } from "../materials/materials.ts";
import { PeerGroupKey } from "../peers/peer-group.ts";
import { forEachMetric, metrics } from "../recipes/metrics.ts";
import { drynessLevels, heightControls, startMethods } from "./machines.ts";

/** All that is ever said about how many shops or recipes stand behind a figure. "3-4" needs a quorum set below 5. */
export const countBands = ["3-4", "5-9", "10-19", "20-49", "50+"] as const;
export const CountBand = z.enum(countBands);
export type CountBand = z.infer<typeof CountBand>;

/** One published edition: figures never change within it. */
export const EditionRef = z.object({ number: z.number().int().positive(), date: z.iso.date() });
export type EditionRef = z.infer<typeof EditionRef>;

/** Rounded quantiles in the metric's stored unit; null where too few shops stand behind the tail. */
export const ReleasedQuantiles = z.object({
  p5: z.number().nullable(),
  p10: z.number().nullable(),
  p25: z.number(),
  p50: z.number(),
  p75: z.number(),
  p90: z.number().nullable(),
  p95: z.number().nullable(),
});
export type ReleasedQuantiles = z.infer<typeof ReleasedQuantiles>;

export const ReleasedDensity = z.object({
  from: z.number().describe("Value at the first height, stored unit"),
  to: z.number().describe("Value at the last height, stored unit"),
  logScale: z.boolean().describe("The grid steps by equal factors rather than equal differences"),
  heights: z
    .array(z.number().min(0).max(1))
    .min(2)
    .describe("Height at each grid point over the highest, to 2 figures"),
});
export type ReleasedDensity = z.infer<typeof ReleasedDensity>;

export const ReleasedDistribution = z.object({
  shops: CountBand.describe("Shops that fill in this metric: may be fewer than the group's"),
  quantiles: ReleasedQuantiles,
  spread: z
    .number()
    .positive()
    .describe("(p75 - p25)/1.349, at least one rounding step. Stored unit; for feed and kerf in natural logs"),
  density: ReleasedDensity.nullable(),
  figuresFrom: EditionRef.describe(
    "The edition this metric's figures were computed for: may be older than the group's",
  ),
});
export type ReleasedDistribution = z.infer<typeof ReleasedDistribution>;

export const ReleasedGroup = z.object({
  status: z.literal("released"),
  key: PeerGroupKey,
  shops: CountBand,
  recipes: CountBand,
  figuresFrom: EditionRef.describe("The edition these figures were computed for: older than the one shown where held"),
  distributions: z.object(forEachMetric(() => ReleasedDistribution.nullable())),
  acceptableShare: z
    .number()
    .min(0.05)
    .max(0.95)
    .nullable()
    .describe("Share of test cuts found acceptable, each shop alike, to 5 %. The ends mean 'or less' and 'or more'"),
});
export type ReleasedGroup = z.infer<typeof ReleasedGroup>;

export const WithheldGroup = z.object({
  status: z.literal("withheld"),
  key: PeerGroupKey,
  reason: z.enum(["quorum", "three-shop-step"]),
});
export type WithheldGroup = z.infer<typeof WithheldGroup>;

export const PeerGroupFigures = z.discriminatedUnion("status", [ReleasedGroup, WithheldGroup]);
export type PeerGroupFigures = z.infer<typeof PeerGroupFigures>;

/** How a metric changes with thickness in one material: value ∝ thickness^exponent. */
export const ThicknessExponent = z.object({
  material: z.enum(materials),
  metric: z.enum(metrics),
  exponent: z.number(),
});
export type ThicknessExponent = z.infer<typeof ThicknessExponent>;

/** Figures about the network as a whole that go with an edition. Made from its released groups only. */
export const NetworkFigures = z.object({ exponents: z.array(ThicknessExponent) });
export type NetworkFigures = z.infer<typeof NetworkFigures>;

/** A trait of the machine behind a listed recipe, shown only where several shops share it. */
export const MachineTraits = z.object({
  startMethod: z.enum(startMethods).nullable(),
  dryness: z.enum(drynessLevels).nullable(),
  heightControl: z.enum(heightControls).nullable(),
});
export type MachineTraits = z.infer<typeof MachineTraits>;

/** A nameless copy of a shared recipe. Its id is random and says nothing about any other record. */
export const ListedRecipe = z.object({
  id: z.uuid(),
  material: z.enum(materials),
  thicknessMm: z.number().describe("To 0.1 mm"),
  nozzleMm: z.number().describe("To 0.1 mm"),
  gas: z.enum(processGases),
  setpoints: z.object(forEachMetric(() => z.number().nullable())),
  quarter: z.string().regex(/^\d{4}-Q[1-4]$/),
  text: z.string().nullable().describe("What the owner typed for others to read, screened"),
  traits: MachineTraits,
});
export type ListedRecipe = z.infer<typeof ListedRecipe>;
