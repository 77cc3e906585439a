import fc from "fast-check";
import { expect, test } from "vitest";
import { huberLocation } from "#shared/stats/huber-location.ts";
import reference from "#tests/data/robust-location-scale.json" with { type: "json" };

// R's MASS::huber, k = 1.5, which stops at steps below 1e-6 of the scale; such steps leave an error of the same order.
test.each(Object.entries(reference.datasets))("equals MASS::huber of %s", (_, { x, huber }) => {
  const { location, scale } = huberLocation(x);
  expect(Math.abs(scale / huber.s - 1)).toBeLessThan(1e-12);
  expect(Math.abs(location - huber.mu)).toBeLessThan(2e-6 * huber.s);
});

// Venables and Ripley, MASS 4th ed., section 5.5 (printed figures from memory).
test("gives the printed figures for the determinations of copper and nickel", () => {
  expect(huberLocation(reference.datasets.chem.x).location.toFixed(4)).toBe("3.2067");
  expect(huberLocation(reference.datasets.abbey.x).location.toFixed(4)).toBe("11.5514");
});

const values = fc.array(fc.double({ min: -100, max: 100, noNaN: true }), { minLength: 1, maxLength: 30 });

test("solves its equation: the values pulled in to k scales balance around the location", () => {
  fc.assert(
    fc.property(values, fc.double({ min: 0.5, max: 4, noNaN: true }), (x, k) => {
      const { location, scale } = huberLocation(x, k);
      const pulled = x.map((v) => Math.min(Math.max(v - location, -k * scale), k * scale));
      const imbalance = pulled.reduce((sum, v) => sum + v, 0) / x.length;
      if (scale > 0) expect(Math.abs(imbalance)).toBeLessThan(1e-11 * scale + 1e-12);
    }),
  );
});

test("follows a change of unit and zero; a huge k gives the mean", () => {
  fc.assert(
    fc.property(values, (x) => {
      const { location, scale } = huberLocation(x);
      expect(huberLocation(x.map((v) => 20 - 3 * v)).location).toBeCloseTo(20 - 3 * location, 6);
      const average = x.reduce((sum, v) => sum + v, 0) / x.length;
      if (scale > 1e-3) expect(huberLocation(x, 1e6).location).toBeCloseTo(average, 9);
    }),
  );
});

test("takes the majority's value where there is no scale", () => {
  expect(huberLocation([4, 4, 4, 90])).toEqual({ location: 4, scale: 0 });
  expect(huberLocation([7])).toEqual({ location: 7, scale: 0 });
});

test.each([
  [[], 1.5],
  [[1, Number.NaN], 1.5],
  [[1, Number.POSITIVE_INFINITY], 1.5],
  [[1, 2], 0],
  [[1, 2], -1],
  [[1, 2], Number.NaN],
])("refuses %j with k %d", (x, k) => {
  expect(() => huberLocation(x, k)).toThrow(RangeError);
});
