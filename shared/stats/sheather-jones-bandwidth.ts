import { quantileType7 } from "./quantile-type7.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";
import { standardDeviation } from "./standard-deviation.ts";

const BINS = 1000;

/** Sample as counts of pairs by distance: `pairs[k]` pairs lie k bins of width `width` apart. */
type PairCounts = { n: number; width: number; pairs: Float64Array };

/**
 * Sheather-Jones bandwidth: how wide should a Gaussian kernel be to show the shape of a sample and no noise?
 * Solves the equation that the best bandwidth satisfies, estimating the density's curvature from the sample with pilot
 * bandwidths that depend on the bandwidth sought ("solve the equation"). Adapts to several peaks, where rules of thumb
 * blur them together. Works on 1000 bins like R, so digits after the third depend on the binning. Assumes independent
 * observations of a continuous quantity; heavily rounded values make it too narrow. O(n log n + bins^2).
 *   scale = min(sd, IQR / 1.349);  a = 1.24 scale n^(-1/7);  b = 1.23 scale n^(-1/9);  c = 1 / (2 sqrt(pi) n)
 *   alpha = 1.357 (S(a) / T(b))^(1/7);  result = the h for which h = (c / S(alpha h^(5/7)))^(1/5)
 *   S(g) = sum over all i, j of phi4((x[i] - x[j]) / g) / (n (n - 1) g^5);  T(g) = minus that with phi6 and g^7;
 *   phi4, phi6: fourth and sixth derivative of the standard normal density
 * @param values  length n >= 2, any order, finite, all in one unit, interquartile range > 0
 * @returns in the unit of values, > 0: the standard deviation of the kernel
 * @throws RangeError when an input breaks its line above, or too few values lie together to solve the equation
 * @see Sheather and Jones (1991), Journal of the Royal Statistical Society B 53(3), 683-690; R's bw.SJ, method "ste"
 */
export function sheatherJonesBandwidth(values: readonly number[]): number {
  requireSample(values, "sheatherJonesBandwidth", 2);
  const n = values.length;
  const spread = quantileType7(values, 0.75) - quantileType7(values, 0.25);
  const scale = Math.min(standardDeviation(values), spread / 1.349);
  requireThat(scale > 0, "sheatherJonesBandwidth needs an interquartile range above 0");

  const counts = countPairs(values);
  const c = 1 / (2 * Math.sqrt(Math.PI) * n);
  const curvature = phi4Sum(counts, 1.24 * scale * n ** (-1 / 7));
  const roughness = -phi6Sum(counts, 1.23 * scale * n ** (-1 / 9));
  requireThat(curvature > 0 && roughness > 0, "sheatherJonesBandwidth needs values that lie closer together");
  const alpha = 1.357 * (curvature / roughness) ** (1 / 7);
  const excess = (h: number) => (c / phi4Sum(counts, alpha * h ** (5 / 7))) ** (1 / 5) - h;

  let upper = 1.144 * scale * n ** (-1 / 5);
  let lower = 0.1 * upper;
  for (let widenings = 0; !(excess(lower) * excess(upper) <= 0); widenings++) {
    requireThat(widenings < 99, "sheatherJonesBandwidth needs values that lie closer together");
    if (widenings % 2 === 0) upper *= 1.2;
    else lower *= 0.8;
  }
  return bisect(excess, lower, upper);
}

/** Bins run from 0, not from the smallest value, as in R: the count depends a little on the zero of the unit. */
function countPairs(values: readonly number[]): PairCounts {
  const smallest = values.reduce((a, b) => Math.min(a, b));
  const largest = values.reduce((a, b) => Math.max(a, b));
  const width = ((largest - smallest) * 1.01) / BINS;
  const first = Math.trunc(smallest / width);
  const inBin = new Float64Array(BINS + 1);
  for (const value of values) inBin[Math.trunc(value / width) - first]!++;

  const pairs = new Float64Array(BINS + 1);
  const filled = [...inBin.keys()].filter((bin) => inBin[bin]! > 0);
  filled.forEach((bin, position) => {
    pairs[0]! += (inBin[bin]! * (inBin[bin]! - 1)) / 2;
    for (let other = 0; other < position; other++) pairs[bin - filled[other]!]! += inBin[bin]! * inBin[filled[other]!]!;
  });
  return { n: values.length, width, pairs };
}

/** S(g) of the formula; the n terms with i = j are written apart, as n * 3. */
function phi4Sum({ n, width, pairs }: PairCounts, g: number): number {
  const sum = pairSum(pairs, width / g, (square) => square * square - 6 * square + 3);
  return (2 * sum + 3 * n) / (n * (n - 1) * g ** 5 * Math.sqrt(2 * Math.PI));
}

/** -T(g) of the formula. */
function phi6Sum({ n, width, pairs }: PairCounts, g: number): number {
  const sum = pairSum(pairs, width / g, (square) => square ** 3 - 15 * square * square + 45 * square - 15);
  return (2 * sum - 15 * n) / (n * (n - 1) * g ** 7 * Math.sqrt(2 * Math.PI));
}

/** Terms beyond a squared distance of 1000 are below 1e-200. */
function pairSum(pairs: Float64Array, step: number, polynomial: (square: number) => number): number {
  let sum = 0;
  for (let k = 0; k < pairs.length && (k * step) ** 2 < 1000; k++) {
    const square = (k * step) ** 2;
    sum += Math.exp(-square / 2) * polynomial(square) * pairs[k]!;
  }
  return sum;
}

/** Halves the interval until it cannot be halved; `f` changes sign in it once, or any of its zeros serves. */
function bisect(f: (h: number) => number, from: number, to: number): number {
  const signAtFrom = Math.sign(f(from));
  let [low, high] = [from, to];
  for (let middle = (low + high) / 2; middle > low && middle < high; middle = (low + high) / 2) {
    if (Math.sign(f(middle)) === signAtFrom) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
