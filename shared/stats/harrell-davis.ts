import betaCdf from "@stdlib/stats-base-dists-beta-cdf";
import { kishSampleSize } from "./kish-sample-size.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";
import { requireWeights } from "./require-weights.ts";

/** Beta probability so small that leaving it out moves a result by less than a double's last digit. */
const NEGLIGIBLE = 1e-17;

/**
 * Harrell-Davis quantile, weighted: below which value does the share p of the population lie?
 * Averages all order statistics, each with the probability that it is the wanted one, so the estimate moves smoothly
 * with p, spreads less than a quantile of one or two values, and equals no single observation. With weights, an
 * observation covers its share of the total weight, and Kish's effective sample size takes the place of n: weights say
 * how much an observation counts, never how often it was seen. Hence a common factor changes nothing, weight 0 is
 * absence, equal weights give the classic estimator, and an integer weight is NOT the observation repeated that often.
 * Assumes independent observations. Not robust in small samples: each order statistic has some weight.
 *   n* = (sum of w)^2 / (sum of w^2), or n without weights;  a = (n* + 1) p;  b = (n* + 1) (1 - p)
 *   t[i] = (w[1] + … + w[i]) / (sum of w), values sorted
 *   result = sum of (F(t[i]) - F(t[i-1])) x[i], F the beta(a, b) distribution function
 * @param values   length n >= 1, any order, finite, all in one unit
 * @param p        unitless, in [0, 1]; 0 and 1 give the limits: the smallest and largest value of weight above 0
 * @param weights  length n, in the order of values, unitless, finite, each >= 0, at least one > 0; all equal if left out
 * @returns in the unit of values, between the smallest and the largest
 * @throws RangeError when an input breaks its line above
 * @see Harrell and Davis (1982), Biometrika 69(3), 635-640; Akinshin (2023), Weighted quantile estimators, arXiv:2304.07265
 */
export function harrellDavis(values: readonly number[], p: number, weights?: readonly number[]): number {
  requireSample(values, "harrellDavis");
  if (weights === undefined) return harrellDavisSorted(Float64Array.from(values).sort(), undefined, p);
  requireThat(weights.length === values.length, "harrellDavis needs one weight for each value");
  const order = values.map((_, i) => i).sort((i, j) => values[i]! - values[j]!);
  return harrellDavisSorted(
    order.map((i) => values[i]!),
    order.map((i) => weights[i]!),
    p,
  );
}

/**
 * `harrellDavis` of a sample that is sorted already: sort once, then ask for many p. Evaluates the beta distribution
 * only where it is neither 0 nor 1 to double precision, which for n values is of the order of sqrt(n) places.
 * @param sortedValues   length n >= 1, ascending, finite, all in one unit
 * @param sortedWeights  length n, in the order of sortedValues, as for harrellDavis; undefined for equal weights
 * @param p              unitless, in [0, 1]
 * @returns in the unit of sortedValues
 * @throws RangeError when an input breaks its line above
 */
export function harrellDavisSorted(
  sortedValues: ArrayLike<number>,
  sortedWeights: ArrayLike<number> | undefined,
  p: number,
): number {
  requireSample(sortedValues, "harrellDavis");
  requireThat(isAscending(sortedValues), "harrellDavisSorted needs ascending values");
  requireThat(p >= 0 && p <= 1, "harrellDavis needs p in [0, 1]");
  const upTo = cumulativeShares(sortedValues.length, sortedWeights);
  if (p === 0) return sortedValues[firstIndex(upTo, (share) => share > 0)]!;
  if (p === 1) return sortedValues[firstIndex(upTo, (share) => share >= 1)]!;

  const size = sortedWeights === undefined ? sortedValues.length : kishSampleSize(sortedWeights);
  const cdf = betaCdf.factory((size + 1) * p, (size + 1) * (1 - p));
  return averageBy(cdf, sortedValues, upTo);
}

/** Sum of the steps of `cdf` times the values, in the form of Abel: from one value on, gaps times what lies above them. */
function averageBy(cdf: (x: number) => number, values: ArrayLike<number>, upTo: Float64Array): number {
  let i = firstIndex(upTo, (share) => cdf(share) > NEGLIGIBLE);
  let result = values[i]!;
  for (; i + 1 < values.length; i++) {
    const above = 1 - cdf(upTo[i]!);
    if (above < NEGLIGIBLE) break;
    result += above * (values[i + 1]! - values[i]!);
  }
  return Math.min(result, values[values.length - 1]!); // rounding may carry the sum past the largest value
}

/** Share of the total weight up to and including each observation; the last is exactly 1. */
function cumulativeShares(n: number, weights: ArrayLike<number> | undefined): Float64Array {
  const upTo = new Float64Array(n);
  if (weights === undefined) return upTo.map((_, i) => (i + 1) / n);
  requireThat(weights.length === n, "harrellDavis needs one weight for each value");
  const largest = requireWeights(weights, "harrellDavis");
  let total = 0;
  for (let i = 0; i < n; i++) {
    total += weights[i]! / largest;
    upTo[i] = total;
  }
  return upTo.map((sum) => sum / total);
}

/** First index where `isReached` holds, by bisection; it must hold from there on, and for the last index. */
function firstIndex(ascending: Float64Array, isReached: (value: number) => boolean): number {
  let low = 0;
  let high = ascending.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (isReached(ascending[middle]!)) high = middle;
    else low = middle + 1;
  }
  return low;
}

function isAscending(values: ArrayLike<number>): boolean {
  for (let i = 1; i < values.length; i++) {
    if (values[i]! < values[i - 1]!) return false;
  }
  return true;
}
