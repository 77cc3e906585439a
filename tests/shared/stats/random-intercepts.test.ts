import fc from "fast-check";
import { expect, test } from "vitest";
import { randomIntercepts } from "#shared/stats/random-intercepts.ts";
import reference from "#tests/data/random-intercepts.json" with { type: "json" };

const near = (got: number, expected: number) => expect(Math.abs(got / expected - 1)).toBeLessThan(1e-9);

// REML fits at 50 digits, agreeing with lme4; Dyestuff's printed 1764.05, 2451.25, 1527.5 and 19.38 are among them.
test.each(Object.entries(reference.fits))("gives variances, mean and offsets of %s", (_, set) => {
  const fit = randomIntercepts(set.groups);
  near(fit.withinVariance, set.within);
  near(fit.betweenVariance, set.between);
  near(fit.mean, set.mean);
  near(fit.standardError, set.standardError);
  for (const [i, offset] of fit.offsets.entries()) near(offset, set.offsets[i]!);
});

// Box and Tiao's generated data: the batches differ less than chance alone would make them, so lme4 puts 0 between them.
test("puts no variance between the batches of Dyestuff2, and so pools all values", () => {
  const { groups } = reference.Dyestuff2;
  const all = groups.flat();
  const average = all.reduce((sum, v) => sum + v, 0) / all.length;
  const fit = randomIntercepts(groups);
  expect(fit.betweenVariance).toBe(0);
  expect(fit.offsets.every((offset) => offset === 0)).toBe(true);
  near(fit.mean, average);
  near(fit.withinVariance, all.reduce((sum, v) => sum + (v - average) ** 2, 0) / (all.length - 1));
});

const groupsOf = (size: number) =>
  fc.array(fc.array(fc.integer({ min: -50, max: 50 }), { minLength: size, maxLength: size }), {
    minLength: 2,
    maxLength: 8,
  });

test("equals the analysis of variance where all groups have one size", () => {
  fc.assert(
    fc.property(groupsOf(4), (groups) => {
      const means = groups.map((group) => group.reduce((sum, v) => sum + v, 0) / 4);
      const centre = means.reduce((sum, v) => sum + v, 0) / means.length;
      const within =
        groups.flatMap((group, i) => group.map((v) => (v - means[i]!) ** 2)).reduce((a, b) => a + b) /
        (3 * groups.length);
      const between = means.reduce((sum, v) => sum + (v - centre) ** 2, 0) / (means.length - 1) - within / 4;
      fc.pre(within > 0 && between > 1e-3);
      const fit = randomIntercepts(groups);
      expect(fit.betweenVariance / between).toBeCloseTo(1, 7);
      expect(fit.withinVariance / within).toBeCloseTo(1, 7);
    }),
  );
});

test("follows a change of unit and zero, and draws every offset in", () => {
  const groups = reference.fits.Dyestuff_unbalanced.groups;
  const fit = randomIntercepts(groups);
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 100, noNaN: true }),
      fc.double({ min: -1000, max: 1000, noNaN: true }),
      (factor, shift) => {
        const other = randomIntercepts(groups.map((group) => group.map((v) => factor * v + shift)));
        expect(other.betweenVariance / factor ** 2 / fit.betweenVariance).toBeCloseTo(1, 6);
        expect((other.mean - shift) / factor).toBeCloseTo(fit.mean, 6);
      },
    ),
  );
  for (const [i, offset] of fit.offsets.entries()) {
    const distance = groups[i]!.reduce((sum, v) => sum + v, 0) / groups[i]!.length - fit.mean;
    expect(offset / distance).toBeGreaterThan(0);
    expect(offset / distance).toBeLessThan(1);
  }
});

test.each([
  ["no groups", []],
  ["one group", [[1, 2, 3]]],
  ["an empty group", [[1, 2], []]],
  [
    "groups without scatter",
    [
      [1, 1],
      [2, 2],
    ],
  ],
  ["groups of one value", [[1], [2], [3]]],
  [
    "NaN",
    [
      [1, 2],
      [Number.NaN, 3],
    ],
  ],
  [
    "an infinite value",
    [
      [1, 2],
      [Number.POSITIVE_INFINITY, 3],
    ],
  ],
])("refuses %s", (_, groups) => {
  expect(() => randomIntercepts(groups)).toThrow(RangeError);
});
