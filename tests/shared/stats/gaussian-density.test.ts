import fc from "fast-check";
import { expect, test } from "vitest";
import { gaussianDensity } from "#shared/stats/gaussian-density.ts";
import reference from "#tests/data/kernel-density.json" with { type: "json" };

// Direct kernel sums by R 4.2.2's dnorm, 15 digits.
test.each(Object.entries(reference.datasets))("equals R's kernel sums of %s", (_, { x, nrd0, at, density_at_nrd0 }) => {
  gaussianDensity(x, nrd0, at).forEach((density, j) => {
    expect(Math.abs(density / density_at_nrd0[j]! - 1)).toBeLessThan(1e-12);
  });
});

const sample = fc.array(fc.tuple(fc.double({ min: -5, max: 5, noNaN: true }), fc.integer({ min: 1, max: 4 })), {
  minLength: 1,
  maxLength: 20,
});

test("integrates to 1, and an integer weight equals repetition", () => {
  fc.assert(
    fc.property(sample, fc.double({ min: 0.2, max: 3, noNaN: true }), (pairs, bandwidth) => {
      const x = pairs.map(([value]) => value);
      const w = pairs.map(([, weight]) => weight);
      const repeated = pairs.flatMap(([value, weight]) => Array<number>(weight).fill(value));
      const grid = Array.from({ length: 801 }, (_, i) => (i - 400) / 10);
      const density = gaussianDensity(x, bandwidth, grid, w);
      expect(density.reduce((sum, d) => sum + d / 10, 0)).toBeCloseTo(1, 8);
      gaussianDensity(repeated, bandwidth, grid).forEach((d, j) => {
        expect(d).toBeCloseTo(density[j]!, 12);
      });
    }),
    { numRuns: 30 },
  );
});

test("gives nothing for no places, and the kernel's own height over a single value", () => {
  expect(gaussianDensity([1, 2], 1, [])).toEqual([]);
  expect(gaussianDensity([3], 2, [3])[0]).toBeCloseTo(1 / (2 * Math.sqrt(2 * Math.PI)), 15);
});

test.each([
  [[], 1, [0], undefined],
  [[1, Number.NaN], 1, [0], undefined],
  [[1], 0, [0], undefined],
  [[1], -1, [0], undefined],
  [[1], Number.POSITIVE_INFINITY, [0], undefined],
  [[1], Number.NaN, [0], undefined],
  [[1], 1, [Number.NaN], undefined],
  [[1, 2], 1, [0], [1]],
  [[1, 2], 1, [0], [0, 0]],
  [[1, 2], 1, [0], [1, -1]],
])("refuses %j with bandwidth %d at %j, weights %j", (x, bandwidth, at, w) => {
  expect(() => gaussianDensity(x, bandwidth, at, w)).toThrow(RangeError);
});
