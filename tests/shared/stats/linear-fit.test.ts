import fc from "fast-check";
import { expect, test } from "vitest";
import { linearFit } from "#shared/stats/linear-fit.ts";
import strd from "#tests/data/nist-strd-linear.json" with { type: "json" };

/** Digits that agree: minus the decimal logarithm of the relative error, as NIST counts them; absolute where 0 is certified. */
const digits = (got: number, certified: number) => -Math.log10(Math.abs((got - certified) / (certified || 1)) || 1e-16);

const polynomial = (x: number) => [0, 1, 2, 3, 4, 5].map((power) => x ** power);
const designs = {
  Norris: strd.datasets.Norris.x.map(([x]) => [1, x!]),
  Longley: strd.datasets.Longley.x.map((row) => [1, ...row]),
  NoInt1: strd.datasets.NoInt1.x,
  Wampler1: strd.datasets.Wampler1.x.map(([x]) => polynomial(x!)),
};

// NIST StRD, certified to 15 digits; the last one or two are lost to the doubles of the data and the result.
test.each(["Norris", "Longley", "NoInt1", "Wampler1"] as const)(
  "gives every certified value of %s to 12.9 digits",
  (name) => {
    const fit = linearFit(designs[name], strd.datasets[name].y);
    const certified = [...strd.datasets[name].estimates, ...strd.datasets[name].sds, strd.datasets[name].residual_sd];
    const got = [...fit.coefficients, ...fit.standardErrors, fit.residualStandardDeviation];
    for (const [i, value] of got.entries()) expect(digits(value, certified[i]!)).toBeGreaterThan(12.9);
  },
);

// NIST StRD Wampler3, 4 and 5: y of Wampler1 plus 1, 100 or 10000 times these (numbers and certified values from memory;
// that they agree confirms both). All coefficients are certified as 1, the first standard error and residual as below.
const disturbance = [759, -2048, 2048, -2048, 2523, -2048, 2048, -2048, 1838, -2048, 2048];
test.each([1, 100, 10000])("gives the certified values of Wampler's polynomial disturbed %d-fold", (fold) => {
  const added = [...disturbance, ...disturbance.slice(0, 10).toReversed()];
  const y = added.map((value, x) => polynomial(x).reduce((a, b) => a + b) + fold * value);
  const fit = linearFit(
    added.map((_, x) => polynomial(x)),
    y,
  );
  for (const coefficient of fit.coefficients) expect(coefficient).toBeCloseTo(1, 13);
  expect(digits(fit.standardErrors[0]!, 2152.3262467817 * fold)).toBeGreaterThan(13);
  expect(digits(fit.residualStandardDeviation, 2360.14502379268 * fold)).toBeGreaterThan(13);
});

test("leaves residuals that no regressor can explain, and carries the units of x", () => {
  const points = fc.array(
    fc.tuple(fc.double({ min: -10, max: 10, noNaN: true }), fc.double({ min: -9, max: 9, noNaN: true })),
    {
      minLength: 4,
      maxLength: 30,
    },
  );
  fc.assert(
    fc.property(points, (pairs) => {
      const x = pairs.map(([value], i) => value + 25 * i);
      const y = pairs.map(([, value]) => value);
      const { coefficients, covariance, standardErrors } = linearFit(
        x.map((v) => [1, v]),
        y,
      );
      const residuals = y.map((v, i) => v - coefficients[0]! - coefficients[1]! * x[i]!);
      expect(residuals.reduce((sum, r) => sum + r, 0)).toBeCloseTo(0, 8);
      expect(residuals.reduce((sum, r, i) => sum + r * x[i]!, 0)).toBeCloseTo(0, 6);
      const inOtherUnit = linearFit(
        x.map((v) => [1, v / 25.4]),
        y,
      );
      expect(inOtherUnit.coefficients[1]! / 25.4).toBeCloseTo(coefficients[1]!, 10);
      expect(inOtherUnit.standardErrors[1]! / 25.4).toBeCloseTo(standardErrors[1]!, 10);
      expect(covariance[0]![1]).toBeCloseTo(covariance[1]![0]!, 12);
    }),
  );
});

test("refuses regressors that add up to another, whatever rounding leaves of them", () => {
  const rows = fc.array(
    fc.tuple(fc.double({ min: -9, max: 9, noNaN: true }), fc.double({ min: -9, max: 9, noNaN: true })),
    {
      minLength: 5,
      maxLength: 40,
    },
  );
  fc.assert(
    fc.property(rows, fc.double({ min: 0.1, max: 3, noNaN: true }), (pairs, factor) => {
      const design = pairs.map(([a, b]) => [1, a, b, 1 + a + factor * b]);
      expect(() =>
        linearFit(
          design,
          pairs.map((_, i) => i),
        ),
      ).toThrow(RangeError);
    }),
  );
});

test("has no doubt about an exact line", () => {
  const fit = linearFit(
    [1, 2, 3, 4].map((x) => [1, x]),
    [5, 7, 9, 11],
  );
  expect(fit).toMatchObject({ coefficients: [3, 2], degreesOfFreedom: 2 });
  expect(Math.max(...fit.standardErrors, fit.residualStandardDeviation)).toBeLessThan(1e-30);
});

test.each([
  ["no observations", [], []],
  [
    "as many regressors as observations",
    [
      [1, 1],
      [1, 2],
    ],
    [1, 2],
  ],
  ["one y too few", [[1], [1], [1]], [1, 2]],
  ["rows of different length", [[1, 2], [1], [1, 3]], [1, 2, 3]],
  ["rows of no length", [[], [], []], [1, 2, 3]],
  [
    "a repeated regressor",
    [
      [1, 3, 3],
      [1, 4, 4],
      [1, 6, 6],
      [1, 7, 7],
    ],
    [1, 2, 3, 4],
  ],
  [
    "x all equal beside an intercept",
    [
      [1, 0.1],
      [1, 0.1],
      [1, 0.1],
    ],
    [1, 2, 3],
  ],
  [
    "a regressor of zeros",
    [
      [1, 0],
      [1, 0],
      [1, 0],
    ],
    [1, 2, 3],
  ],
  ["NaN among the regressors", [[1], [Number.NaN], [1]], [1, 2, 3]],
  ["an infinite y", [[1], [1], [1]], [1, 2, Number.POSITIVE_INFINITY]],
])("refuses %s", (_, rows, y) => {
  expect(() => linearFit(rows, y)).toThrow(RangeError);
});
