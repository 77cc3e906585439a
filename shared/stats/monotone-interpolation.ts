import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/**
 * Smooth curve through given points that rises and falls only where they do: what lies between the knots?
 * A cubic in each interval, with one slope per knot. The slopes start as the mean of the neighbouring secants and are
 * shrunk where the cubic would overshoot, so rising data give a rising curve; a plain cubic spline does not promise
 * that. Level data stay level, and a knot where the data turn is the curve's own turning point. O(n) to prepare,
 * O(log n) a value. Assumes exact points: it smooths nothing.
 *   secant[k] = (y[k+1] - y[k]) / (x[k+1] - x[k]);  slope[k] = (secant[k-1] + secant[k]) / 2, at the ends the secant,
 *   0 where the secants differ in sign; with alpha = slope[k] / secant[k], beta = slope[k+1] / secant[k], both are
 *   multiplied by 3 / sqrt(alpha^2 + beta^2) where 2 alpha + beta > 3, alpha + 2 beta > 3 and
 *   alpha < (2 alpha + beta - 3)^2 / (3 (alpha + beta - 2)), the condition for not being monotone
 * @param x  length n >= 2, knots, strictly increasing, finite
 * @param y  length n, values at the knots, finite, all in one unit
 * @returns the curve as a function from [x[0], x[n-1]] to the unit of y; exact at the knots. It refuses to extrapolate:
 *          what lies beyond the knots is the caller's decision
 * @throws RangeError when an input breaks its line above, also from the returned function
 * @see Fritsch and Carlson (1980), SIAM Journal on Numerical Analysis 17(2), 238-246; starting slopes as in R's
 *      splinefun(method = "monoH.FC")
 */
export function monotoneInterpolation(x: readonly number[], y: readonly number[]): (at: number) => number {
  requireThat(x.length === y.length, "monotoneInterpolation needs one y for each x");
  requireSample(x, "monotoneInterpolation", 2);
  requireSample(y, "monotoneInterpolation", 2);
  requireThat(
    x.every((knot, k) => k === 0 || knot > x[k - 1]!),
    "monotoneInterpolation needs strictly increasing x",
  );
  const knots = [...x];
  const heights = [...y];
  const slopes = limitedSlopes(knots, heights);

  return (at) => {
    requireThat(at >= knots[0]! && at <= knots.at(-1)!, "monotoneInterpolation needs a value between its knots");
    const k = intervalOf(knots, at);
    const width = knots[k + 1]! - knots[k]!;
    const [low, high] = [heights[k]!, heights[k + 1]!];
    const t = (at - knots[k]!) / width;
    if (t === 0 || t === 1) return t === 0 ? low : high;
    const rise = t * t * (3 - 2 * t);
    const bend = width * t * (1 - t) * ((1 - t) * slopes[k]! - t * slopes[k + 1]!);
    const height = low + rise * (high - low) + bend;
    return Math.min(Math.max(height, Math.min(low, high)), Math.max(low, high)); // against rounding alone
  };
}

function limitedSlopes(x: readonly number[], y: readonly number[]): number[] {
  const secants = x.slice(1).map((knot, k) => (y[k + 1]! - y[k]!) / (knot - x[k]!));
  const slopes = x.map((_, k) => {
    const [left, right] = [secants[k - 1] ?? secants[k]!, secants[k] ?? secants[k - 1]!];
    return Math.sign(left) === Math.sign(right) ? left / 2 + right / 2 : 0;
  });
  secants.forEach((secant, k) => {
    // alpha and beta times |secant|, which may be as small as a double gets
    const [alpha, beta, one] = [Math.abs(slopes[k]!), Math.abs(slopes[k + 1]!), Math.abs(secant)];
    const pastAlpha = 2 * alpha + beta - 3 * one;
    const pastBeta = alpha + 2 * beta - 3 * one;
    if (pastAlpha > 0 && pastBeta > 0 && (alpha / pastAlpha) * (pastAlpha + pastBeta) < pastAlpha) {
      const shrink = (3 * one) / Math.hypot(alpha, beta);
      slopes[k] = slopes[k]! * shrink;
      slopes[k + 1] = slopes[k + 1]! * shrink;
    }
  });
  return slopes;
}

/** Index of the interval that holds `at`; the last knot belongs to the last interval. */
function intervalOf(knots: readonly number[], at: number): number {
  let low = 0;
  let high = knots.length - 2;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (knots[middle]! <= at) low = middle;
    else high = middle - 1;
  }
  return low;
}
