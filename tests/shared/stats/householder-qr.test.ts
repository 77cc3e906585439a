import fc from "fast-check";
import { expect, test } from "vitest";
import { decomposeQr, invertGram, solveAugmented } from "#shared/stats/householder-qr.ts";

const dot = (a: ArrayLike<number>, b: ArrayLike<number>) => Array.from(a).reduce((sum, v, i) => sum + v * b[i]!, 0);

/** Polynomial columns, shaken a little: far from a square matrix's symmetry and far enough from singular. */
const problem = fc.array(
  fc.tuple(...Array.from({ length: 3 }, () => fc.double({ min: -0.1, max: 0.1, noNaN: true }))),
  {
    minLength: 5,
    maxLength: 12,
  },
);
const columnsOf = (rows: number[][]) =>
  [0, 1, 2].map((power) => Float64Array.from(rows, (row, i) => (i / rows.length) ** power + row[power]!));

test("solves r + X b = f together with X' r = g", () => {
  fc.assert(
    fc.property(problem, fc.tuple(fc.integer(), fc.integer(), fc.integer()), (rows, [g0, g1, g2]) => {
      const columns = columnsOf(rows);
      const f = rows.map((row, i) => row[0]! * 30 + (i % 3));
      const g = [g0, g1, g2].map((value) => value / 2 ** 30);
      const { b, residuals } = solveAugmented(decomposeQr(columns), f, g);
      const size = 1 + Math.max(...b.map(Math.abs), ...residuals.map(Math.abs));
      columns.forEach((column, j) => {
        expect(Math.abs(dot(column, residuals) - g[j]!)).toBeLessThan(1e-11 * size);
      });
      f.forEach((value, i) => {
        const fitted = columns.reduce((sum, column, j) => sum + column[i]! * b[j]!, 0);
        expect(Math.abs(residuals[i]! + fitted - value)).toBeLessThan(1e-11 * size);
      });
    }),
  );
});

test("inverts X'X", () => {
  fc.assert(
    fc.property(problem, (rows) => {
      const columns = columnsOf(rows);
      const inverse = invertGram(decomposeQr(columns));
      const size = Math.max(...inverse.flat().map(Math.abs));
      inverse.forEach((row, i) => {
        columns.forEach((column, j) => {
          const entry = columns.reduce((sum, other, k) => sum + row[k]! * dot(other, column), 0);
          expect(Math.abs(entry - (i === j ? 1 : 0))).toBeLessThan(1e-13 * size + 1e-12);
        });
      });
    }),
  );
});

test("shows a column that depends on the one before it as a diagonal near 0", () => {
  const { r } = decomposeQr([Float64Array.of(1, 2, 3), Float64Array.of(2, 4, 6)]);
  expect(Math.abs(r[1]![1]!)).toBeLessThan(64 * Number.EPSILON * Math.sqrt(56));
  expect(Math.abs(r[0]![0]!)).toBeCloseTo(Math.sqrt(14), 14);
});
