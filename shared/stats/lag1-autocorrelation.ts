import { mean } from "./mean.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/**
 * Autocorrelation at lag 1: does a value resemble the one before it?
 * 0 for independent values, towards 1 where neighbours stay together, towards -1 where they alternate. Assumes evenly
 * spaced values of a series with one level throughout: a drift counts as resemblance. Leans towards 0 in short series,
 * by about (1 + 4 r) / n. O(n).
 *   m = mean;  result = sum of (x[i] - m) (x[i+1] - m), i = 1..n-1, / sum of (x[i] - m)^2, i = 1..n
 * @param values  length n >= 2, in order of time, finite, all in one unit, not all equal
 * @returns unitless, in (-1, 1)
 * @throws RangeError when an input breaks its line above
 * @see NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.5.12; Box and Jenkins (1976), Time Series Analysis
 */
export function lag1Autocorrelation(values: readonly number[]): number {
  requireSample(values, "lag1Autocorrelation", 2);
  const level = mean(values);
  const deviations = values.map((value) => value - level);
  const largest = deviations.reduce((most, d) => Math.max(most, Math.abs(d)), 0);
  requireThat(largest > 0, "lag1Autocorrelation needs values that are not all equal");
  let together = 0;
  let squares = 0;
  for (const [i, d] of deviations.entries()) {
    squares += (d / largest) ** 2;
    if (i > 0) together += (d / largest) * (deviations[i - 1]! / largest);
  }
  return together / squares;
}
