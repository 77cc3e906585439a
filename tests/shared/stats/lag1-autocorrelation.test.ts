import fc from "fast-check";
import { expect, test } from "vitest";
import { lag1Autocorrelation } from "#shared/stats/lag1-autocorrelation.ts";
import reference from "#tests/data/autocorrelation.json" with { type: "json" };
import strd from "#tests/data/nist-strd-univariate.json" with { type: "json" };

// NIST StRD, certified to 15 digits; a small spread on a large level leaves fewer.
test.each([
  ["Lew", -0.307304800605679, 14],
  ["Michelso", 0.535199668621283, 12],
  ["NumAcc1", -0.5, 15],
  ["NumAcc3", -0.999, 9],
] as const)("gives the certified autocorrelation of %s, %d, to %d digits", (name, certified, digits) => {
  expect(lag1Autocorrelation(strd.datasets[name].y)).toBeCloseTo(certified, digits);
});

// R 4.2.2 acf(), 15 digits.
test.each(Object.entries(reference.datasets))("equals R's acf of %s at lag 1", (_, { x, lag1 }) => {
  expect(lag1Autocorrelation(x)).toBeCloseTo(lag1, 12);
});

test("ignores unit, zero and direction of time, and stays below 1", () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: -100, max: 100 }), { minLength: 2, maxLength: 40 }), (x) => {
      fc.pre(new Set(x).size > 1);
      const plain = lag1Autocorrelation(x);
      expect(lag1Autocorrelation(x.map((v) => 7 - 0.01 * v).toReversed())).toBeCloseTo(plain, 9);
      expect(Math.abs(plain)).toBeLessThan(1);
    }),
  );
});

test.each([[[]], [[1]], [[2, 2, 2]], [[1, Number.NaN]], [[1, Number.POSITIVE_INFINITY]]])("refuses %j", (x) => {
  expect(() => lag1Autocorrelation(x)).toThrow(RangeError);
});
