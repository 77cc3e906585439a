import fc from "fast-check";
import { expect, test } from "vitest";
import { mad } from "#shared/stats/mad.ts";
import reference from "#tests/data/robust-location-scale.json" with { type: "json" };

// R 4.2.2 stats::mad, constant 1.4826.
test.each(Object.entries(reference.datasets))("equals R's mad of %s", (_, sample) => {
  expect(Math.abs(mad(sample.x) / sample.mad - 1)).toBeLessThan(1e-12);
});

test("ignores the zero, follows the unit, and is not moved by one wild value", () => {
  const values = fc.array(fc.double({ min: -100, max: 100, noNaN: true }), { minLength: 3, maxLength: 30 });
  fc.assert(
    fc.property(values, fc.double({ min: -50, max: 50, noNaN: true }), (x, shift) => {
      expect(mad(x.map((v) => shift - 2 * v))).toBeCloseTo(2 * mad(x), 9);
      expect(mad([1e12, ...x])).toBeLessThan(1.4826 * 200 + 1e-9);
    }),
  );
});

test("is 0 for one value and where more than half are equal", () => {
  expect(mad([5])).toBe(0);
  expect(mad([5, 5, 5, 1, 900])).toBe(0);
});

test.each([[[]], [[1, Number.NaN]], [[1, Number.POSITIVE_INFINITY]]])("refuses %j", (x) => {
  expect(() => mad(x)).toThrow(RangeError);
});
