import { quantileSorted } from "simple-statistics";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/**
 * Sample quantile, type 7: below which value does the share p of the sample lie?
 * Takes the two order statistics around p and draws a straight line between them. This is the rule of spreadsheets, of
 * R's default and of percentile_cont in SQL. It uses at most two values, so it jumps about in small samples and it
 * shows single values as they are; use harrellDavis where that matters. O(n log n).
 *   h = (n - 1) p + 1;  result = x(floor h) + (h - floor h) * (x(floor h + 1) - x(floor h)), x sorted, counted from 1
 * @param values  length n >= 1, any order, finite, all in one unit
 * @param p       unitless, in [0, 1]; 0 gives the smallest value, 1 the largest
 * @returns in the unit of values
 * @throws RangeError when an input breaks its line above
 * @see Hyndman and Fan (1996), The American Statistician 50(4), 361-365, definition 7
 */
export function quantileType7(values: readonly number[], p: number): number {
  requireSample(values, "quantileType7");
  requireThat(p >= 0 && p <= 1, "quantileType7 needs p in [0, 1]");
  // The package's other entry, `quantile`, partitions instead of sorting; its definition is also type 7 in this version.
  return quantileSorted(
    values.toSorted((a, b) => a - b),
    p,
  );
}
