import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";
import { requireWeights } from "./require-weights.ts";

/**
 * Kernel density: how densely do the values of a sample lie at given places?
 * Puts a normal curve of standard deviation `bandwidth` over each observation and adds them up, exactly, without
 * binning. Assumes independent observations of a quantity without a hard limit nearby: mass leaks past one. O(n m).
 *   result[j] = sum over i of w[i] * exp(-((at[j] - x[i]) / h)^2 / 2) / (h * sqrt(2 pi) * sum of w)
 * @param values     length n >= 1, any order, finite, all in one unit
 * @param bandwidth  in the unit of values, finite, > 0
 * @param at         length m >= 0, places to evaluate, in the unit of values, finite
 * @param weights    length n, unitless, finite, each >= 0, at least one > 0; a common factor changes nothing
 * @returns length m, density in 1 / unit of values; its integral over all places is 1
 * @throws RangeError when an input breaks its line above
 * @see Silverman (1986), Density Estimation for Statistics and Data Analysis, Chapman and Hall, eq. 2.2a
 */
export function gaussianDensity(
  values: readonly number[],
  bandwidth: number,
  at: readonly number[],
  weights?: readonly number[],
): number[] {
  requireSample(values, "gaussianDensity");
  requireSample(at, "gaussianDensity", 0);
  requireThat(bandwidth > 0 && Number.isFinite(bandwidth), "gaussianDensity needs a bandwidth above 0");
  const relative = weights ?? values.map(() => 1);
  requireThat(relative.length === values.length, "gaussianDensity needs one weight for each value");
  const largest = requireWeights(relative, "gaussianDensity");
  const total = relative.reduce((sum, weight) => sum + weight / largest, 0);
  const scale = 1 / (bandwidth * Math.sqrt(2 * Math.PI) * total);

  return at.map((place) => {
    let sum = 0;
    for (let i = 0; i < values.length; i++) {
      const distance = (place - values[i]!) / bandwidth;
      sum += (relative[i]! / largest) * Math.exp(-0.5 * distance * distance);
    }
    return sum * scale;
  });
}
