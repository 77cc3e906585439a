import fc from "fast-check";
import { expect, test } from "vitest";
import { mean } from "#shared/stats/mean.ts";
import strd from "#tests/data/nist-strd-univariate.json" with { type: "json" };

// NIST StRD, certified to 15 digits.
test.each(Object.entries(strd.datasets))("gives the certified mean of %s to 15 digits", (_, set) => {
  expect(mean(set.y).toPrecision(15)).toBe(set.mean.toPrecision(15));
});

// NIST StRD NumAcc4: 10000000.2 once, then 10000000.1 and 10000000.3 in turn, 1001 values; certified 10000000.2.
test("gives the certified mean of NumAcc4", () => {
  const y = Array.from({ length: 1001 }, (_, i) => (i === 0 ? 10000000.2 : i % 2 === 1 ? 10000000.1 : 10000000.3));
  expect(mean(y).toPrecision(15)).toBe((10000000.2).toPrecision(15));
});

test("keeps what plain addition loses", () => {
  expect(mean([1e16, 1, -1e16])).toBeCloseTo(1 / 3, 15);
});

test("does not depend on the order", () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: -1e9, max: 1e9, noNaN: true }), { minLength: 1 }), (x) => {
      expect(Math.abs(mean(x) - mean(x.toSorted((a, b) => a - b)))).toBeLessThanOrEqual(1e-6);
    }),
  );
});

test.each([[[]], [[1, Number.NaN]], [[Number.NEGATIVE_INFINITY]], [[1.7e308, 1.7e308]]])("refuses %j", (x) => {
  expect(() => mean(x)).toThrow(RangeError);
});
