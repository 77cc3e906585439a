import type { ReleasedDistribution, ReleasedQuantiles } from "../contracts/released-figures.ts";
import { type QuantileLabel, quantileLabels, quantileShares } from "../disclosure/tails.ts";
import type { Metric } from "../recipes/metrics.ts";
import { monotoneInterpolation } from "../stats/monotone-interpolation.ts";
import { requireThat } from "../stats/require-that.ts";
import { toScale } from "./scale.ts";

export type StandingWord = "typical" | "high" | "low" | "unusually high" | "unusually low";

/** Where a value lies among its peers, as far as the released figures tell. */
export interface Standing {
  /** Whole per cent of peers at or below the value; null outside the released quantiles. */
  percentile: number | null;
  position: "below" | "inside" | "above";
  /** The outermost released quantile, where the value lies beyond it. */
  edge: QuantileLabel | null;
  /** (value - p50) / spread, on a log scale for feed and kerf. */
  robustZ: number;
  word: StandingWord;
}

interface Knot {
  label: QuantileLabel;
  at: number;
  percent: number;
}

/**
 * Standing of one value from the released figures of its group alone, so that trying values teaches nothing more than
 * the figures say. The percentile is a Fritsch-Carlson interpolation of the released quantiles; it never falls as the
 * value rises.
 * @param value  stored unit; above 0 for feed and kerf
 */
export function standingOf(metric: Metric, value: number, distribution: ReleasedDistribution): Standing {
  requireThat(Number.isFinite(value), "standingOf needs a finite value");
  const scaled = toScale(metric, value);
  const knots = knotsOf(metric, distribution.quantiles);
  const [lowest, highest] = [knots[0]!, knots.at(-1)!]; // p25 to p75 are always there
  const robustZ = (scaled - toScale(metric, distribution.quantiles.p50)) / distribution.spread;
  const word = wordFor(robustZ);
  if (scaled < lowest.at) return { percentile: null, position: "below", edge: lowest.label, robustZ, word };
  if (scaled > highest.at) return { percentile: null, position: "above", edge: highest.label, robustZ, word };
  return { percentile: Math.round(percentAt(knots, scaled)), position: "inside", edge: null, robustZ, word };
}

function knotsOf(metric: Metric, quantiles: ReleasedQuantiles): Knot[] {
  return quantileLabels.flatMap((label) => {
    const value = quantiles[label];
    return value === null ? [] : [{ label, at: toScale(metric, value), percent: 100 * quantileShares[label] }];
  });
}

/** Rounded quantiles often agree: a value they share stands in the middle of the shares it covers. */
function percentAt(knots: readonly Knot[], scaled: number): number {
  const at = [...new Set(knots.map((knot) => knot.at))];
  const percents = at.map((place) => {
    const tied = knots.filter((knot) => knot.at === place);
    return (tied[0]!.percent + tied.at(-1)!.percent) / 2;
  });
  return at.length === 1 ? percents[0]! : monotoneInterpolation(at, percents)(scaled);
}

function wordFor(robustZ: number): StandingWord {
  if (Math.abs(robustZ) <= 1) return "typical";
  if (Math.abs(robustZ) <= 2) return robustZ > 0 ? "high" : "low";
  return robustZ > 0 ? "unusually high" : "unusually low";
}

export function isUnusual(standing: Pick<Standing, "word">): boolean {
  return standing.word === "unusually high" || standing.word === "unusually low";
}
