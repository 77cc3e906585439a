import fc from "fast-check";
import { expect, test } from "vitest";
import { quantileType7 } from "#shared/stats/quantile-type7.ts";
import published from "#tests/data/quantiles-type7.json" with { type: "json" };

// Hyndman and Fan (1996), definition 7; values as printed by R 4.2.2 to 15 digits.
test.each(Object.entries(published.samples))("gives R's type 7 quantiles of %s", (_, sample) => {
  sample.probs.forEach((p, i) => {
    expect(Math.abs(quantileType7(sample.x, p) / sample.type7[i]! - 1)).toBeLessThan(1e-13);
  });
});

test("gives the 90th percentile of the wafers printed in NIST/SEMATECH e-Handbook 7.2.6.2 for R7", () => {
  expect(quantileType7(published.samples.wafers_nist_7262.x, 0.9).toFixed(4)).toBe("95.1957");
});

test("follows a change of unit and leaves its input alone", () => {
  const sample = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 40 });
  fc.assert(
    fc.property(sample, fc.double({ min: 0, max: 1, noNaN: true }), (x, p) => {
      const before = [...x];
      const inInches = quantileType7(
        x.map((v) => v / 25.4),
        p,
      );
      expect(inInches * 25.4).toBeCloseTo(quantileType7(x, p), 6);
      expect(x).toEqual(before);
    }),
  );
});

test("gives smallest and largest at 0 and 1, and the one value there is", () => {
  expect(quantileType7([3, 1, 2], 0)).toBe(1);
  expect(quantileType7([3, 1, 2], 1)).toBe(3);
  expect(quantileType7([7], 0.3)).toBe(7);
});

test.each([
  [[], 0.5],
  [[1, Number.NaN], 0.5],
  [[1, Number.POSITIVE_INFINITY], 0.5],
  [[1, 2], -0.01],
  [[1, 2], 1.01],
  [[1, 2], Number.NaN],
])("refuses %j at %d", (x, p) => {
  expect(() => quantileType7(x, p)).toThrow(RangeError);
});
