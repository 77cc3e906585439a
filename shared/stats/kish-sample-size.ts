import { requireWeights } from "./require-weights.ts";

/**
 * Kish's effective sample size: how many equally weighted observations is this weighted sample worth?
 * Few large weights among small ones make the answer small: a sample that one member dominates is worth little more
 * than one observation. Weights are relative: a common factor changes nothing, and an observation of weight 0 is
 * not there. Assumes weights that do not depend on the values they weigh. O(n).
 *   result = (sum of w)^2 / (sum of w^2)
 * @param weights  length n >= 1, unitless, finite, each >= 0, at least one > 0
 * @returns unitless, in [1, n]; n when all weights are equal
 * @throws RangeError when an input breaks its line above
 * @see Kish (1965), Survey Sampling, Wiley; Akinshin (2023), arXiv:2304.07265
 */
export function kishSampleSize(weights: ArrayLike<number>): number {
  const largest = requireWeights(weights, "kishSampleSize");
  let sum = 0;
  let sumOfSquares = 0;
  for (let i = 0; i < weights.length; i++) {
    const share = weights[i]! / largest;
    sum += share;
    sumOfSquares += share * share;
  }
  return (sum * sum) / sumOfSquares;
}
