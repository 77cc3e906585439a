import fc from "fast-check";
import { expect, test } from "vitest";
import { standardDeviation } from "#shared/stats/standard-deviation.ts";
import strd from "#tests/data/nist-strd-univariate.json" with { type: "json" };

/** Digits that agree: minus the decimal logarithm of the relative error, as NIST counts them. */
const digits = (got: number, certified: number) => -Math.log10(Math.abs(got - certified) / certified || 1e-16);

// NIST StRD, certified to 15 digits. A level of 1e6 over a spread of 0.1 leaves a double 1e-16 * 1e7 = 9 digits.
test.each([
  ["Lew", 14],
  ["Michelso", 12],
  ["NumAcc1", 15],
  ["NumAcc3", 9],
] as const)("gives the certified standard deviation of %s to %d digits", (name, expected) => {
  expect(digits(standardDeviation(strd.datasets[name].y), strd.datasets[name].stddev)).toBeGreaterThan(expected);
});

// NIST StRD NumAcc4, certified 0.1; the data themselves are rounded to 9e-10, so 8 digits are all there are.
test("gives the certified standard deviation of NumAcc4", () => {
  const y = Array.from({ length: 1001 }, (_, i) => (i === 0 ? 10000000.2 : i % 2 === 1 ? 10000000.1 : 10000000.3));
  expect(digits(standardDeviation(y), 0.1)).toBeGreaterThan(8);
});

test("ignores the zero and follows the unit", () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 2 }), (x) => {
      const plain = standardDeviation(x);
      expect(standardDeviation(x.map((v) => 2 ** 30 - 3 * v))).toBeCloseTo(3 * plain, 8);
    }),
  );
});

test("is 0 for equal values", () => {
  expect(standardDeviation([0.1, 0.1, 0.1])).toBe(0);
});

test.each([[[]], [[1]], [[1, Number.NaN]], [[1, Number.POSITIVE_INFINITY]]])("refuses %j", (x) => {
  expect(() => standardDeviation(x)).toThrow(RangeError);
});
