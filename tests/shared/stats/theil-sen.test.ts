import fc from "fast-check";
import { expect, test } from "vitest";
import { theilSen } from "#shared/stats/theil-sen.ts";
import reference from "#tests/data/theil-sen.json" with { type: "json" };

// scipy 1.10.1 stats.theilslopes; the third case is the example of Sen (1968): slope 4, interval 3.71 to 4.38.
test.each(Object.entries(reference.cases))("gives the line and interval of %s", (_, set) => {
  const line = theilSen(set.x, set.y);
  expect(line.slope).toBeCloseTo(set.slope, 12);
  expect(line.intercept).toBeCloseTo(set.intercept_separate, 12);
  expect(line.lower).toBeCloseTo(set.slope_lo95, 12);
  expect(line.upper).toBeCloseTo(set.slope_hi95, 12);
});

// scipy 1.17.1 stats.theilslopes of invented, tied data; without the correction for ties the lower limit would be 1/3.
test("narrows the interval by what tied values cannot contribute", () => {
  const x = [1, 1, 2, 2, 3, 3, 4, 4, 5, 5, 6, 6, 7, 7, 8, 8];
  const y = [3, 0, 5, -2, -1, 0, 1, 2, 7, 2, 6, 4, 5, 3, 9, 6];
  expect(theilSen(x, y)).toEqual({ slope: 1, intercept: -1.5, lower: 3 / 7, upper: 1.5 });
});

const points = fc.array(fc.tuple(fc.integer({ min: 0, max: 30 }), fc.double({ min: -50, max: 50, noNaN: true })), {
  minLength: 3,
  maxLength: 25,
});

test("adds a trend to the slope and its interval, and turns them when y is turned", () => {
  fc.assert(
    fc.property(points, fc.double({ min: -5, max: 5, noNaN: true }), (pairs, trend) => {
      const x = pairs.map(([value]) => value);
      fc.pre(new Set(x).size > 1);
      const y = pairs.map(([, value]) => value);
      fc.pre(new Set(y).size === y.length); // ties in y would be broken by the trend
      const plain = theilSen(x, y);
      const tilted = theilSen(
        x,
        y.map((v, i) => v + trend * x[i]!),
      );
      const turned = theilSen(
        x,
        y.map((v) => -v),
      );
      expect(tilted.slope).toBeCloseTo(plain.slope + trend, 9);
      expect(turned.slope).toBeCloseTo(-plain.slope, 9);
      if (Number.isFinite(plain.lower)) expect(turned.upper).toBeCloseTo(-plain.lower, 9);
      expect(plain.lower <= plain.slope && plain.slope <= plain.upper).toBe(true);
    }),
  );
});

test("is not carried away by a quarter of wild values", () => {
  const x = Array.from({ length: 20 }, (_, i) => i);
  const line = theilSen(
    x,
    x.map((v) => (v % 4 === 0 ? 1e6 : 2 * v + 1)),
  );
  expect(line.slope).toBe(2);
});

// Of the 24 orders of four values one gives all slopes one sign: 2 / 24 > 0.05, so no 95 % interval of slopes exists.
test("leaves the interval open where four points cannot bear 95 %, and closes it at 80 %", () => {
  expect(theilSen([1, 2, 3, 4], [1, 2, 4, 7])).toMatchObject({
    lower: Number.NEGATIVE_INFINITY,
    upper: Number.POSITIVE_INFINITY,
  });
  expect(theilSen([1, 2, 3, 4], [1, 2, 4, 7], 0.8)).toMatchObject({ lower: 1, upper: 3 });
});

test.each([
  [[], []],
  [[1], [1]],
  [[1, 2], [1]],
  [
    [3, 3, 3],
    [1, 2, 3],
  ],
  [
    [1, Number.NaN],
    [1, 2],
  ],
  [
    [1, 2],
    [1, Number.POSITIVE_INFINITY],
  ],
])("refuses x %j with y %j", (x, y) => {
  expect(() => theilSen(x, y)).toThrow(RangeError);
});

test.each([0, 1, -0.5, Number.NaN])("refuses a confidence of %d", (confidence) => {
  expect(() => theilSen([1, 2, 3], [1, 2, 3], confidence)).toThrow(RangeError);
});
