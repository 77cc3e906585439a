import { medianSorted } from "simple-statistics";
import { normalQuantile } from "./normal-quantile.ts";
import { quantileType7 } from "./quantile-type7.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/** Slopes in units of y per unit of x, the intercept in the unit of y. */
export type TheilSen = { slope: number; intercept: number; lower: number; upper: number };

/**
 * Theil-Sen line: does y change with x, how fast, and how sure is that, wild values aside?
 * The slope is the median of the slopes between all pairs of points; up to 29 % of the points may be arbitrarily wrong.
 * The interval holds the slopes whose ranks Kendall's statistic cannot tell from zero trend. Where so few points
 * cannot bear the confidence asked for, it is unbounded: infinite, never narrower than justified. Assumes independent,
 * equally distributed errors; correlated ones need a wider interval. O(n^2 log n) time and n^2 / 2 numbers of memory.
 *   slopes = (y[j] - y[i]) / (x[j] - x[i]) for all x[j] > x[i], sorted, N of them
 *   slope = their median;  intercept = median of y - slope * median of x
 *   variance = (n (n-1) (2n+5) - sum over groups of t tied x, and of t tied y, of t (t-1) (2t+5)) / 18
 *   C = normal quantile at (1 + confidence) / 2, times sqrt(variance)
 *   lower = slope of rank round((N - C) / 2), upper = of rank round((N + C) / 2) + 1, counted from 1
 * @param x           length n >= 2, finite, at least two different
 * @param y           length n, finite
 * @param confidence  unitless, in (0, 1)
 * @returns see TheilSen; lower <= slope <= upper
 * @throws RangeError when an input breaks its line above
 * @see Sen (1968), Journal of the American Statistical Association 63(324), 1379-1389; intercept after Conover (1999),
 *      Practical Nonparametric Statistics, 3rd ed.
 */
export function theilSen(x: readonly number[], y: readonly number[], confidence = 0.95): TheilSen {
  requireThat(x.length === y.length, "theilSen needs one y for each x");
  requireSample(x, "theilSen", 2);
  requireSample(y, "theilSen", 2);
  requireThat(confidence > 0 && confidence < 1, "theilSen needs a confidence in (0, 1)");
  const slopes = pairwiseSlopes(x, y);
  requireThat(slopes.length > 0, "theilSen needs at least two different x");

  const n = x.length;
  const variance = (n * (n - 1) * (2 * n + 5) - tieCorrection(x) - tieCorrection(y)) / 18;
  const reach = normalQuantile((1 + confidence) / 2) * Math.sqrt(variance);
  const slope = medianSorted(slopes);
  return {
    slope,
    intercept: quantileType7(y, 0.5) - slope * quantileType7(x, 0.5),
    lower: slopes[Math.round((slopes.length - reach) / 2) - 1] ?? Number.NEGATIVE_INFINITY,
    upper: slopes[Math.round((slopes.length + reach) / 2)] ?? Number.POSITIVE_INFINITY,
  };
}

function pairwiseSlopes(x: readonly number[], y: readonly number[]): number[] {
  const slopes: number[] = [];
  for (let j = 1; j < x.length; j++) {
    for (let i = 0; i < j; i++) {
      if (x[i] !== x[j]) slopes.push((y[j]! - y[i]!) / (x[j]! - x[i]!));
    }
  }
  return Array.from(Float64Array.from(slopes).sort());
}

/** Takes out of Kendall's variance what tied values cannot contribute. */
function tieCorrection(values: readonly number[]): number {
  const counts = new Map<number, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts.values()].reduce((sum, t) => sum + t * (t - 1) * (2 * t + 5), 0);
}
