import { requireThat } from "./require-that.ts";

/**
 * Effective sample size of a series: how many independent values would fix its mean as well?
 * Neighbours that resemble each other repeat what is known already, so the standard error of the mean is the standard
 * deviation divided by the square root of this number, not of n. Assumes an autoregression of order 1: the likeness
 * fades by the factor r with each step. Alternation, r < 0, would make the mean better than n independent values; as r
 * is an estimate, that gain is not claimed and n is returned. O(n) at most.
 *   result = n / (1 + 2 * sum over k = 1..n-1 of (1 - k/n) r^k)
 * @param n     number of values, integer, >= 1
 * @param lag1  r, unitless, in (-1, 1): autocorrelation at lag 1
 * @returns unitless, in [1, n]
 * @throws RangeError when an input breaks its line above
 * @see Bayley and Hammersley (1946), Supplement to the Journal of the Royal Statistical Society 8(2), 184-197
 */
export function effectiveSampleSize(n: number, lag1: number): number {
  requireThat(Number.isInteger(n) && n >= 1, "effectiveSampleSize needs a whole number of at least one value");
  requireThat(lag1 > -1 && lag1 < 1, "effectiveSampleSize needs an autocorrelation in (-1, 1)");
  if (lag1 <= 0) return n;
  let likeness = 0;
  let power = lag1; // summed term by term: the closed form cancels where r is near 1
  for (let k = 1; k < n && power > Number.EPSILON / n; k++) {
    likeness += (1 - k / n) * power;
    power *= lag1;
  }
  return n / (1 + 2 * likeness);
}
