import type { DisclosureParameters } from "./parameters.ts";

export const quantileLabels = ["p5", "p10", "p25", "p50", "p75", "p90", "p95"] as const;
export type QuantileLabel = (typeof quantileLabels)[number];

export const quantileShares: Record<QuantileLabel, number> = {
  p5: 0.05,
  p10: 0.1,
  p25: 0.25,
  p50: 0.5,
  p75: 0.75,
  p90: 0.9,
  p95: 0.95,
};

/** The tails rule: the further out a quantile, the fewer shops stand behind it. Never a minimum or maximum. */
export function mayShowQuantile(label: QuantileLabel, shops: number, parameters: DisclosureParameters): boolean {
  if (label === "p5" || label === "p95") return shops >= parameters.farTailsFrom;
  if (label === "p10" || label === "p90") return shops >= parameters.tailsFrom;
  return shops >= parameters.quorum;
}

/** The density shows where single shops stand once they are few: it comes with p10 and p90. */
export function mayShowDensity(shops: number, parameters: DisclosureParameters): boolean {
  return shops >= parameters.tailsFrom;
}
