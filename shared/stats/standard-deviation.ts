import { sum } from "simple-statistics";
import { mean } from "./mean.ts";
import { requireSample } from "./require-sample.ts";

/**
 * Sample standard deviation: how far do single values usually lie from their mean?
 * Two passes with compensated sums: first the mean, then the deviations from it. The second term takes back what the
 * rounding of the mean put in, so a small spread on a large level keeps all digits the data have. Assumes
 * independent values; not robust, see mad. O(n).
 *   d[i] = x[i] - mean;  result = sqrt((sum of d^2 - (sum of d)^2 / n) / (n - 1))
 * @param values  length n >= 2, finite, all in one unit
 * @returns in the unit of values, >= 0; 0 when all are equal
 * @throws RangeError when an input breaks its line above
 * @see Chan, Golub and LeVeque (1983), The American Statistician 37(3), 242-247
 */
export function standardDeviation(values: readonly number[]): number {
  requireSample(values, "standardDeviation", 2);
  const level = mean(values);
  const deviations = values.map((value) => value - level);
  const squares = sum(deviations.map((d) => d * d));
  const rounding = sum(deviations) ** 2 / values.length;
  return Math.sqrt(Math.max(0, squares - rounding) / (values.length - 1));
}
