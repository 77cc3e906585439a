import fc from "fast-check";
import { expect, test } from "vitest";
import { effectiveSampleSize } from "#shared/stats/effective-sample-size.ts";
import reference from "#tests/data/autocorrelation.json" with { type: "json" };

// Bayley and Hammersley (1946); computed with R 4.2.2 to 15 digits.
test.each(Object.entries(reference.datasets))("gives the exact AR(1) size of %s", (_, { x, lag1, ess }) => {
  expect(effectiveSampleSize(x.length, lag1)).toBeCloseTo(ess, 10);
});

// The sum over k has a closed form, and for long series the result tends to n (1 - r) / (1 + r).
test("equals the closed form, and the simple rule for long series", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 3000 }), fc.double({ min: 0.01, max: 0.99, noNaN: true }), (n, r) => {
      const likeness = r / (1 - r) - (r * (1 - r ** n)) / (n * (1 - r) ** 2);
      expect(effectiveSampleSize(n, r) / (n / (1 + 2 * likeness))).toBeCloseTo(1, 9);
    }),
  );
  expect(effectiveSampleSize(1e6, 0.6) / (1e6 * (0.4 / 1.6))).toBeCloseTo(1, 5);
});

test("is n without likeness or with alternation, 1 for one value, and nearly 1 where all values go together", () => {
  expect(effectiveSampleSize(50, 0)).toBe(50);
  expect(effectiveSampleSize(50, -0.4)).toBe(50);
  expect(effectiveSampleSize(1, 0.9)).toBe(1);
  expect(effectiveSampleSize(50, 1 - 1e-9)).toBeCloseTo(1, 6);
});

test.each([
  [0, 0.5],
  [2.5, 0.5],
  [Number.NaN, 0.5],
  [10, 1],
  [10, -1],
  [10, Number.NaN],
])("refuses %d values with autocorrelation %d", (n, r) => {
  expect(() => effectiveSampleSize(n, r)).toThrow(RangeError);
});
