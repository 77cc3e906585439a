import { roundForRelease, roundingStep } from "../disclosure/rounding.ts";
import { type QuantileLabel, quantileLabels, quantileShares } from "../disclosure/tails.ts";
import { type Metric, metricDefinitions } from "../recipes/metrics.ts";
import { gaussianDensity } from "../stats/gaussian-density.ts";
import { harrellDavis } from "../stats/harrell-davis.ts";
import { quantileType7 } from "../stats/quantile-type7.ts";
import { sheatherJonesBandwidth } from "../stats/sheather-jones-bandwidth.ts";
import { standardDeviation } from "../stats/standard-deviation.ts";
import type { Contribution } from "./contribution.ts";
import { drawInLoneExtremes } from "./lone-extremes.ts";
import { fromScale, toScale } from "./scale.ts";
import { shopWeightedValues, type WeightedValue } from "./shop-weights.ts";

/** A metric of one group on its own scale, before any disclosure rule: never sent anywhere as it is. */
export interface RawDistribution {
  metric: Metric;
  /** On the metric's scale, lone extremes drawn in. */
  values: WeightedValue[];
  /** In the metric's stored unit. */
  quantiles: Record<QuantileLabel, number>;
}

export interface DensityCurve {
  /** Stored unit, first and last grid point. */
  from: number;
  to: number;
  /** Over the highest, so that the top is 1. */
  heights: number[];
}

const gridPoints = 64;

/** Shop-weighted Harrell-Davis quantiles of a metric; null where nobody fills it in. */
export function rawDistribution(metric: Metric, contributions: readonly Contribution[]): RawDistribution | null {
  const given = shopWeightedValues(metric, contributions);
  if (given.length === 0) return null;
  const values = drawInLoneExtremes(given.map((v) => ({ ...v, value: toScale(metric, v.value) })));
  const numbers = values.map((v) => v.value);
  const weights = values.map((v) => v.weight);
  const quantiles = quantileLabels.map(
    (label) => [label, fromScale(metric, harrellDavis(numbers, quantileShares[label], weights))] as const,
  );
  return { metric, values, quantiles: Object.fromEntries(quantiles) as RawDistribution["quantiles"] };
}

/**
 * Density for the picture, on a grid from one bandwidth below p10 to one above p90. The ends follow released figures and
 * the bandwidth, never the smallest and largest value, and are rounded like any released figure.
 * @param p10 @param p90  rounded, stored unit
 */
export function densityCurve(raw: RawDistribution, p10: number, p90: number): DensityCurve {
  const { metric } = raw;
  const bandwidth = bandwidthOf(raw, p10);
  const { hard } = metricDefinitions[metric];
  const end = (near: number, side: 1 | -1) => {
    const beyond = fromScale(metric, toScale(metric, near) + side * bandwidth);
    return roundForRelease(metric, Math.min(hard.max, Math.max(hard.min, beyond)));
  };
  const from = end(p10, -1);
  const to = end(p90, 1);
  const start = toScale(metric, from);
  const step = (toScale(metric, to) - start) / (gridPoints - 1);
  const grid = Array.from({ length: gridPoints }, (_, i) => start + step * i);
  const density = gaussianDensity(
    raw.values.map((v) => v.value),
    bandwidth,
    grid,
    raw.values.map((v) => v.weight),
  );
  const highest = Math.max(...density);
  return { from, to, heights: density.map((height) => height / highest) };
}

/**
 * Sheather-Jones over one value a shop, so that a shop with many recipes does not narrow it. Never under two rounding
 * steps: most shops set whole amperes, and a narrower kernel would draw a needle at what a single one typed.
 */
function bandwidthOf({ metric, values }: RawDistribution, near: number): number {
  const narrowest = toScale(metric, near + 2 * roundingStep(metric, near)) - toScale(metric, near);
  const sums = new Map<number, number>();
  for (const { shop, value, weight } of values) sums.set(shop, (sums.get(shop) ?? 0) + value * weight);
  const means = [...sums.values()];
  const levelMiddle = quantileType7(means, 0.75) <= quantileType7(means, 0.25);
  return Math.max(narrowest, levelMiddle ? ruleOfThumb(means) : sheatherJonesOr(means));
}

/** Sheather-Jones has no solution for a few values far apart: then the rule of thumb, which is wider and so tells less. */
function sheatherJonesOr(values: readonly number[]): number {
  try {
    return sheatherJonesBandwidth(values);
  } catch (error) {
    if (error instanceof RangeError) return ruleOfThumb(values);
    throw error;
  }
}

/** Silverman (1986), Density Estimation, eq. 3.28, of the standard deviation alone: 0 only where all values agree. */
function ruleOfThumb(values: readonly number[]): number {
  return values.length < 2 ? 0 : 1.06 * standardDeviation(values) * values.length ** (-1 / 5);
}
