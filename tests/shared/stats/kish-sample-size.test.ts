import fc from "fast-check";
import { expect, test } from "vitest";
import { kishSampleSize } from "#shared/stats/kish-sample-size.ts";
import reference from "#tests/data/harrell-davis-weighted.json" with { type: "json" };

test.each(Object.entries(reference.samples))("gives the effective sample size computed apart for %s", (_, sample) => {
  expect(kishSampleSize(sample.w)).toBeCloseTo(sample.kish, 12);
});

test("gives n for equal weights, 1 for a single counting one, and ignores weights of 0", () => {
  expect(kishSampleSize([0.2, 0.2, 0.2, 0.2, 0.2])).toBeCloseTo(5, 14);
  expect(kishSampleSize([0, 3, 0])).toBe(1);
  expect(kishSampleSize([1, 2, 0, 3])).toBe(kishSampleSize([1, 2, 3]));
});

test("lies in [1, n] and does not depend on the unit of the weights, however large or small", () => {
  const weights = fc.array(fc.double({ min: 0.001, max: 1000, noNaN: true }), { minLength: 1, maxLength: 50 });
  fc.assert(
    fc.property(weights, fc.constantFrom(1e-300, 1e-9, 7, 1e300), (w, factor) => {
      const size = kishSampleSize(w);
      expect(size).toBeGreaterThan(1 - 1e-12);
      expect(size).toBeLessThan(w.length * (1 + 1e-12));
      expect(kishSampleSize(w.map((v) => v * factor)) / size).toBeCloseTo(1, 12);
    }),
  );
});

test.each([[[]], [[0, 0]], [[1, -1]], [[1, Number.NaN]], [[1, Number.POSITIVE_INFINITY]]])("refuses %j", (w) => {
  expect(() => kishSampleSize(w)).toThrow(RangeError);
});
