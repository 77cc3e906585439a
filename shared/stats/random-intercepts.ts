import { mean } from "./mean.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/** Mean, standard error and offsets in the unit of the values, variances in its square. */
export type RandomIntercepts = {
  mean: number;
  standardError: number;
  betweenVariance: number;
  withinVariance: number;
  /** For each group, in the order given: its predicted distance from the mean, drawn in towards 0. */
  offsets: number[];
};

/** What the likelihood needs of the groups. */
type Summary = { sizes: number[]; means: number[]; count: number; within: number };

/** The ratio of variances is sought between 2^-40 and 2^60, on a grid of powers of two. */
const SMALLEST_POWER = -40;
const LARGEST_POWER = 60;

/**
 * One-way random effects by REML: how much do groups differ beyond the scatter within them, and where is each?
 * Splits the variance into one between and one within groups by restricted maximum likelihood, which for groups of one
 * size equals the analysis of variance and stays sound where sizes differ. A group's offset is its mean's distance from
 * the common mean, shrunk by what chance alone would give: a small group moves little. Assumes normal offsets,
 * independent normal scatter of one variance in all groups, and group sizes that have nothing to do with the values.
 * With g = between / within, w[i] = n[i] / (1 + n[i] g), m = sum of w[i] mean[i] / sum of w, N values in all:
 *   Q(g) = sum of squares within groups + sum of w[i] (mean[i] - m)^2;  within = Q(g) / (N - 1)
 *   g minimises (N - 1) log Q(g) + sum of log(1 + n[i] g) + log(sum of w) over g >= 0
 *   standard error = sqrt(within / sum of w);  offset[i] = g w[i] (mean[i] - m)
 * @param groups  k >= 2 groups, each of length >= 1, finite, all in one unit, not all values equal to their group's mean
 * @returns see RandomIntercepts; betweenVariance is 0 where groups differ no more than chance would have them
 * @throws RangeError when an input breaks its line above
 * @see Patterson and Thompson (1971), Biometrika 58(3), 545-554; Searle, Casella and McCulloch (1992), Variance
 *      Components, Wiley
 */
export function randomIntercepts(groups: readonly (readonly number[])[]): RandomIntercepts {
  requireThat(groups.length >= 2, "randomIntercepts needs at least two groups");
  for (const group of groups) requireSample(group, "randomIntercepts");
  const summary = summarise(groups);
  requireThat(summary.within > 0, "randomIntercepts needs scatter within the groups");

  const ratio = likeliestRatio(summary);
  const { weights, total, centre, distances, squares } = weigh(summary, ratio);
  const withinVariance = squares / (summary.count - 1);
  return {
    mean: centre,
    standardError: Math.sqrt(withinVariance / total),
    betweenVariance: ratio * withinVariance,
    withinVariance,
    offsets: weights.map((weight, i) => ratio * weight * distances[i]!),
  };
}

function summarise(groups: readonly (readonly number[])[]): Summary {
  const means = groups.map((group) => mean(group));
  const squares = groups.flatMap((group, i) => group.map((value) => (value - means[i]!) ** 2));
  return {
    sizes: groups.map((group) => group.length),
    means,
    count: squares.length,
    within: squares.reduce((sum, square) => sum + square, 0),
  };
}

/** The quantities of the formula at the ratio g. */
function weigh({ sizes, means, within }: Summary, ratio: number) {
  const weights = sizes.map((size) => size / (1 + size * ratio));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centre = means.reduce((sum, value, i) => sum + (weights[i]! / total) * value, 0);
  const distances = means.map((value) => value - centre);
  const squares = distances.reduce((sum, d, i) => sum + weights[i]! * d * d, within);
  return { weights, total, centre, distances, squares };
}

/** The criterion to be made smallest. */
function criterion(summary: Summary, ratio: number): number {
  const { total, squares } = weigh(summary, ratio);
  const sizes = summary.sizes.reduce((sum, size) => sum + Math.log1p(size * ratio), 0);
  return (summary.count - 1) * Math.log(squares) + sizes + Math.log(total);
}

/** Derivative of the criterion by g. */
function slope(summary: Summary, ratio: number): number {
  const { weights, total, distances, squares } = weigh(summary, ratio);
  const pull = weights.reduce((sum, weight, i) => sum + (weight * distances[i]!) ** 2, 0);
  const spread = weights.reduce((sum, weight) => sum + weight * (weight / total), 0);
  return total - spread - (summary.count - 1) * (pull / squares);
}

/** Lowest of the criterion's valleys and its value at 0: with unequal group sizes there may be more than one valley. */
function likeliestRatio(summary: Summary): number {
  const grid = [0];
  for (let power = SMALLEST_POWER; power <= LARGEST_POWER; power++) grid.push(2 ** power);
  const slopes = grid.map((ratio) => slope(summary, ratio));
  requireThat(slopes.at(-1)! > 0, "randomIntercepts needs scatter within the groups");
  const candidates = [0];
  for (let i = 1; i < grid.length; i++) {
    if (slopes[i - 1]! < 0 && slopes[i]! >= 0) candidates.push(bottomBetween(summary, grid[i - 1]!, grid[i]!));
  }
  const heights = candidates.map((ratio) => criterion(summary, ratio));
  return candidates[heights.indexOf(Math.min(...heights))]!;
}

/** Halves an interval at whose start the criterion falls and at whose end it rises, until it cannot be halved. */
function bottomBetween(summary: Summary, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let middle = (low + high) / 2; middle > low && middle < high; middle = (low + high) / 2) {
    if (slope(summary, middle) < 0) low = middle;
    else high = middle;
  }
  return high;
}
