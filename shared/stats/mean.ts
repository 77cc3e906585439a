import { mean as compensatedMean } from "simple-statistics";
import { requireSample } from "./require-sample.ts";

/**
 * Arithmetic mean: what would each value be if all were equal and had the same sum?
 * Adds with Neumaier's compensation, so the sum is as good as if carried in twice the digits: values that differ only
 * in their last places keep them. Not robust: one wild value moves it without limit. O(n).
 *   result = (x[1] + … + x[n]) / n
 * @param values  length n >= 1, finite, all in one unit; their sum must be finite too
 * @returns in the unit of values
 * @throws RangeError when an input breaks its line above
 * @see Neumaier (1974), Zeitschrift fuer Angewandte Mathematik und Mechanik 54(1), 39-51
 */
export function mean(values: readonly number[]): number {
  requireSample(values, "mean");
  const result = compensatedMean(values as number[]); // declared mutable by the package, which only reads
  if (!Number.isFinite(result)) throw new RangeError("mean needs values whose sum is finite");
  return result;
}
