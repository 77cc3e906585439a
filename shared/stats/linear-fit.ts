import { compensatedDot } from "./compensated-dot.ts";
import { decomposeQr, type HouseholderQr, invertGram, solveAugmented } from "./householder-qr.ts";
import { requireSample } from "./require-sample.ts";
import { requireThat } from "./require-that.ts";

/** Each in the unit of y per unit of its regressor; `covariance` holds the products of two such units. */
export type LinearFit = {
  coefficients: number[];
  standardErrors: number[];
  covariance: number[][];
  /** In the unit of y. */
  residualStandardDeviation: number;
  degreesOfFreedom: number;
};

const REFINEMENTS = 3;

/**
 * Linear least squares: which combination of the regressors comes closest to y, and how sure is each coefficient?
 * Scales the columns to one length, decomposes them by Householder QR, and corrects the solution by fitting its own
 * residuals, computed in twice the digits. There is no intercept but one given as a regressor of ones. Standard errors
 * assume independent errors of one variance and regressors without error; not robust, see theilSen. O(n p^2).
 *   b = the b of least |X b - y|;  s^2 = |X b - y|^2 / (n - p);  covariance = s^2 (X'X)^-1
 * @param rows  length n > p, one row of p >= 1 regressors for each observation, such as [1, x] or [1, x, x^2]; finite,
 *              none a combination of the others
 * @param y     length n, finite, all in one unit
 * @returns see LinearFit; coefficients in the order of the regressors
 * @throws RangeError when an input breaks its line above
 * @see Golub and Van Loan (2013), Matrix Computations, 4th ed., section 5.3; Bjorck (1967), BIT 7(4), 257-278
 */
export function linearFit(rows: readonly (readonly number[])[], y: readonly number[]): LinearFit {
  const count = rows[0]?.length ?? 0;
  requireThat(rows.length === y.length, "linearFit needs one row of regressors for each y");
  requireThat(count >= 1 && rows.every((row) => row.length === count), "linearFit needs rows of one length");
  requireThat(y.length > count, "linearFit needs more observations than regressors");
  requireSample(rows.flat(), "linearFit");
  requireSample(y, "linearFit");

  const scales = scalesOf(rows, count);
  const columns = scales.map((scale, j) => Float64Array.from(rows, (row) => row[j]! / scale));
  const qr = decomposeQr(columns);
  const smallest = Number.EPSILON * Math.max(64, rows.length); // columns have length about 1; rounding leaves a few EPSILON
  requireThat(
    qr.r.every((row, k) => Math.abs(row[k]!) > smallest),
    "linearFit needs regressors of which none is a combination of the others",
  );
  const { b, residuals } = solveRefined(columns, y, qr);

  const degreesOfFreedom = y.length - count;
  const variance = compensatedDot(0, residuals, residuals) / degreesOfFreedom;
  const gram = invertGram(qr);
  const covariance = gram.map((row, i) => row.map((value, j) => (value * variance) / scales[i]! / scales[j]!));
  return {
    coefficients: Array.from(b, (value, j) => value / scales[j]!),
    standardErrors: covariance.map((row, i) => Math.sqrt(row[i]!)),
    covariance,
    residualStandardDeviation: Math.sqrt(variance),
    degreesOfFreedom,
  };
}

/** Length of each column, as a power of two: dividing by it loses nothing. */
function scalesOf(rows: readonly (readonly number[])[], count: number): number[] {
  return Array.from({ length: count }, (_, j) => {
    const largest = rows.reduce((most, row) => Math.max(most, Math.abs(row[j]!)), 0);
    requireThat(largest > 0, "linearFit needs regressors that are not all zero");
    const length = largest * Math.sqrt(rows.reduce((sum, row) => sum + (row[j]! / largest) ** 2, 0));
    return 2 ** Math.round(Math.log2(length));
  });
}

/** Solves, then corrects the solution and its residuals by what the equations, in twice the digits, leave open. */
function solveRefined(columns: readonly Float64Array[], y: readonly number[], qr: HouseholderQr) {
  const solution = solveAugmented(qr, y, new Float64Array(columns.length));
  const { b, residuals } = solution;
  for (let round = 0; round < REFINEMENTS; round++) {
    const openInY = residuals.map((left, i) => {
      const row = columns.map((column) => column[i]!);
      return compensatedDot(y[i]!, [...row, left], [...b.map((value) => -value), -1]);
    });
    const openInGram = columns.map((column) => -compensatedDot(0, column, residuals));
    const step = solveAugmented(qr, openInY, openInGram);
    step.b.forEach((value, j) => {
      b[j]! += value;
    });
    step.residuals.forEach((value, i) => {
      residuals[i]! += value;
    });
  }
  return solution;
}
