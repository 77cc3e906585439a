import fc from "fast-check";
import { expect, test } from "vitest";
import { monotoneInterpolation } from "#shared/stats/monotone-interpolation.ts";

// Fritsch and Carlson (1980), worked by hand. Secants 1 and 9, starting slopes 1, 5, 9: in the first interval
// (alpha, beta) = (1, 5) is outside the monotone region, so both shrink by 3 / sqrt(26). Its middle then lies at
// (0 + 1) / 2 + (3 / sqrt(26) - 15 / sqrt(26)) / 8; the second interval keeps 15 / sqrt(26) and 9.
test("shrinks overshooting slopes as Fritsch and Carlson prescribe", () => {
  const curve = monotoneInterpolation([0, 1, 2], [0, 1, 10]);
  expect(curve(0.5)).toBeCloseTo(0.5 - 1.5 / Math.sqrt(26), 14);
  expect(curve(1.5)).toBeCloseTo(5.5 + (15 / Math.sqrt(26) - 9) / 8, 14);
});

// Secants 2, 1 and 0.01. The middle interval's (1.5, 0.505) is steep at one end only and inside the monotone region, so
// its first slope stays; the last interval's (50.5, 1) is not, which turns the knot before it to 0.03 * 0.505 / hypot.
test("leaves slopes alone that are inside the monotone region", () => {
  const curve = monotoneInterpolation([0, 1, 2, 3], [0, 2, 3, 3.01]);
  const third = (0.03 * 0.505) / Math.hypot(0.505, 0.01);
  expect(curve(1.5)).toBeCloseTo(2.5 + (1.5 - third) / 8, 13);
});

test("turns exactly at a knot where the data turn", () => {
  const curve = monotoneInterpolation([0, 1, 3, 4], [0, 2, 1, 5]);
  for (const away of [1e-3, 0.1, 0.5]) {
    expect(curve(1 - away)).toBeLessThan(2);
    expect(curve(1 + away)).toBeLessThan(2);
  }
  expect((curve(1.001) - 2) / 0.001).toBeCloseTo(0, 2); // level there: slopes 0 and 0 over the middle interval
  expect(curve(2)).toBeCloseTo(1.5, 14);
});

test("mirrors when the data fall, and when read from the other end", () => {
  const curve = monotoneInterpolation([0, 1, 2], [0, 1, 10]);
  const fallen = monotoneInterpolation([0, 1, 2], [0, -1, -10]);
  const turned = monotoneInterpolation([-2, -1, 0], [10, 1, 0]);
  for (const at of [0.1, 0.5, 0.9, 1.3, 1.8]) {
    expect(fallen(at)).toBeCloseTo(-curve(at), 14);
    expect(turned(-at)).toBeCloseTo(curve(at), 14);
  }
});

// Akima's data as listed in Fritsch and Carlson (1980), data set AKIMA (numbers from memory): level, then steep.
test("neither dips nor overshoots on Akima's data, where a cubic spline does", () => {
  const x = [0, 2, 3, 5, 6, 8, 9, 11, 12, 14, 15];
  const y = [10, 10, 10, 10, 10, 10, 10.5, 15, 50, 60, 85];
  const curve = monotoneInterpolation(x, y);
  const path = Array.from({ length: 1501 }, (_, i) => curve(i / 100));
  expect(path).toEqual(path.toSorted((a, b) => a - b));
  expect(curve(7)).toBe(10);
});

test("reproduces a straight line, and every knot exactly", () => {
  const x = [0, 0.5, 2, 7];
  const line = monotoneInterpolation(
    x,
    x.map((v) => 3 - 2 * v),
  );
  for (const at of [0.2, 1, 3.3, 6.9]) expect(line(at)).toBeCloseTo(3 - 2 * at, 13);
  const curve = monotoneInterpolation([0.1, 0.3, 0.7], [0.1, 0.2, 0.9]);
  expect([0.1, 0.3, 0.7].map(curve)).toEqual([0.1, 0.2, 0.9]);
});

const rising = fc
  .array(fc.tuple(fc.double({ min: 1e-3, max: 100, noNaN: true }), fc.double({ min: 0, max: 100, noNaN: true })), {
    minLength: 2,
    maxLength: 12,
  })
  .map((steps) => {
    let [x, y] = [0, 0];
    return steps.map(([dx, dy]) => {
      x += dx;
      y += dy;
      return { x, y };
    });
  });

test("rises wherever the data rise, and stays between neighbouring knots", () => {
  fc.assert(
    fc.property(rising, (knots) => {
      const curve = monotoneInterpolation(
        knots.map((k) => k.x),
        knots.map((k) => k.y),
      );
      const [from, to] = [knots[0]!.x, knots.at(-1)!.x];
      const path = Array.from({ length: 201 }, (_, i) =>
        curve(i === 200 ? to : Math.min(to, from + ((to - from) * i) / 200)),
      );
      for (let i = 1; i < path.length; i++) expect(path[i]!).toBeGreaterThanOrEqual(path[i - 1]! - 1e-10);
      expect(path.at(0)).toBe(knots[0]!.y);
      expect(path.at(-1)).toBe(knots.at(-1)!.y);
    }),
  );
});

test.each([
  [[], []],
  [[1], [1]],
  [[1, 2], [1]],
  [
    [1, 1],
    [1, 2],
  ],
  [
    [2, 1],
    [1, 2],
  ],
  [
    [1, Number.NaN],
    [1, 2],
  ],
  [
    [1, 2],
    [1, Number.POSITIVE_INFINITY],
  ],
])("refuses knots %j with values %j", (x, y) => {
  expect(() => monotoneInterpolation(x, y)).toThrow(RangeError);
});

test.each([0.99, 3.01, Number.NaN])("refuses %d, outside its knots", (at) => {
  expect(() => monotoneInterpolation([1, 3], [5, 6])(at)).toThrow(RangeError);
});
