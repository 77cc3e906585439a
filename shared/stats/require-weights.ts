import { requireThat } from "./require-that.ts";

/**
 * Refuses weights that are negative, not finite or all zero. `who` names the function.
 * @returns the largest weight: dividing by it keeps sums and squares of any finite weights within range
 */
export function requireWeights(weights: ArrayLike<number>, who: string): number {
  let largest = 0;
  for (let i = 0; i < weights.length; i++) {
    const weight = weights[i]!;
    requireThat(Number.isFinite(weight) && weight >= 0, `${who} needs finite weights of at least 0`);
    if (weight > largest) largest = weight;
  }
  requireThat(largest > 0, `${who} needs at least one weight above 0`);
  return largest;
}
