import type {
  EditionRef,
  ReleasedDensity,
  ReleasedDistribution,
  ReleasedQuantiles,
} from "../contracts/released-figures.ts";
import type { Contribution } from "../peers/contribution.ts";
import { densityCurve, type RawDistribution, rawDistribution } from "../peers/distribution.ts";
import { toScale } from "../peers/scale.ts";
import { type Metric, metricDefinitions } from "../recipes/metrics.ts";
import { countBandOf } from "./count-bands.ts";
import type { DisclosureParameters } from "./parameters.ts";
import { distinctShops, meetsQuorum } from "./quorum.ts";
import { roundForRelease, roundingStep } from "./rounding.ts";
import { mayShowDensity, mayShowQuantile, type QuantileLabel, quantileLabels } from "./tails.ts";

/** Interquartile range of a normal distribution in standard deviations. */
const normalInterquartile = 1.349;

/**
 * One metric of a group under the quorum, tails, bands and rounding rules; null where too few shops fill it in. The
 * number of shops is that of the metric: a group of twenty may have six that know their kerf.
 */
export function releaseDistribution(
  metric: Metric,
  contributions: readonly Contribution[],
  parameters: DisclosureParameters,
  edition: EditionRef,
): ReleasedDistribution | null {
  const giving = contributions.filter((c) => c.setpoints[metric] !== null);
  const raw = meetsQuorum(giving, parameters) ? rawDistribution(metric, giving) : null;
  if (raw === null) return null;
  const shops = distinctShops(giving);
  const quantiles = roundedQuantiles(raw, shops, parameters);
  return {
    shops: countBandOf(shops),
    quantiles,
    spread: releasedSpread(metric, quantiles),
    density: mayShowDensity(shops, parameters) ? releasedDensity(raw, quantiles) : null,
    figuresFrom: edition,
  };
}

function roundedQuantiles(raw: RawDistribution, shops: number, parameters: DisclosureParameters): ReleasedQuantiles {
  let last = -Infinity;
  const rounded = quantileLabels.map((label): [QuantileLabel, number | null] => {
    // Neighbouring estimates may cross by a double's last digit, and so fall to either side of a rounding limit.
    last = Math.max(last, roundForRelease(raw.metric, raw.quantiles[label]));
    return [label, mayShowQuantile(label, shops, parameters) ? last : null];
  });
  return Object.fromEntries(rounded) as ReleasedQuantiles; // p25, p50 and p75 pass with the quorum
}

/** From the rounded quartiles, so that it tells nothing they do not; at least a rounding step, so that it divides. */
function releasedSpread(metric: Metric, { p25, p50, p75 }: ReleasedQuantiles): number {
  const step = toScale(metric, p50 + roundingStep(metric, p50)) - toScale(metric, p50);
  const spread = (toScale(metric, p75) - toScale(metric, p25)) / normalInterquartile;
  return Number(Math.max(spread, step).toPrecision(3));
}

function releasedDensity(raw: RawDistribution, { p10, p90 }: ReleasedQuantiles): ReleasedDensity | null {
  if (p10 === null || p90 === null) return null;
  const { from, to, heights } = densityCurve(raw, p10, p90);
  return {
    from,
    to,
    logScale: metricDefinitions[raw.metric].logScale,
    heights: heights.map((height) => Number(height.toPrecision(2))),
  };
}
