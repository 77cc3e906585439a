import { medianAbsoluteDeviation } from "simple-statistics";
import { requireSample } from "./require-sample.ts";

/** 1 / (third quartile of the standard normal), rounded as is customary: makes mad estimate a normal sigma. */
const NORMAL_CONSISTENCY = 1.4826;

/**
 * Median absolute deviation, scaled: how far do single values usually lie from the middle, wild ones aside?
 * Half of the values lie nearer to the median than the unscaled figure. Up to half of the sample may be arbitrarily
 * wrong without carrying it away. Scaled to estimate the standard deviation of normal data; there it needs about
 * 2.7 times as many values as the standard deviation for the same precision. O(n).
 *   result = 1.4826 * median of |x[i] - median of x|
 * @param values  length n >= 1, any order, finite, all in one unit
 * @returns in the unit of values, >= 0; 0 when more than half of the values are equal, though others may differ
 * @throws RangeError when an input breaks its line above
 * @see Hampel (1974), Journal of the American Statistical Association 69(346), 383-393
 */
export function mad(values: readonly number[]): number {
  requireSample(values, "mad");
  return NORMAL_CONSISTENCY * medianAbsoluteDeviation(values as number[]); // declared mutable by the package, which only reads
}
