import betaCdf from "@stdlib/stats-base-dists-beta-cdf";
import fc from "fast-check";
import { expect, test } from "vitest";
import { harrellDavis, harrellDavisSorted } from "#shared/stats/harrell-davis.ts";
import { kishSampleSize } from "#shared/stats/kish-sample-size.ts";
import classic from "#tests/data/harrell-davis.json" with { type: "json" };
import weighted from "#tests/data/harrell-davis-weighted.json" with { type: "json" };

const sample = fc.array(
  fc.record({
    value: fc.double({ min: -1000, max: 1000, noNaN: true }),
    weight: fc.double({ min: 0.01, max: 50, noNaN: true }),
  }),
  { minLength: 1, maxLength: 40 },
);
const probability = fc.double({ min: 0, max: 1, noNaN: true });

// Harrell and Davis (1982), values of R's Hmisc::hdquantile printed to 15 digits.
test.each(Object.entries(classic.samples))("reproduces the classic estimates of %s", (_, { x, probs, estimate }) => {
  probs.forEach((p, i) => {
    expect(Math.abs(harrellDavis(x, p) / estimate[i]! - 1)).toBeLessThan(1e-12);
  });
});

// Akinshin (2023), arXiv:2304.07265, evaluated at 50 digits.
test.each(Object.entries(weighted.samples))(
  "reproduces the weighted estimates of %s",
  (_, { x, w, probs, estimate }) => {
    probs.forEach((p, i) => {
      expect(Math.abs(harrellDavis(x, p, w) / estimate[i]! - 1)).toBeLessThan(1e-12);
    });
  },
);

test("equal weights, whatever their size, give the classic estimator", () => {
  fc.assert(
    fc.property(sample, probability, fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (s, p, weight) => {
      const x = s.map((o) => o.value);
      const equal = x.map(() => weight);
      expect(Math.abs(harrellDavis(x, p, equal) - harrellDavis(x, p))).toBeLessThan(1e-12 * 2000);
    }),
  );
});

test("a common factor on the weights, observations of weight 0 and the order change nothing", () => {
  fc.assert(
    fc.property(sample, probability, fc.constantFrom(1e-200, 0.37, 1e200), (s, p, factor) => {
      const x = s.map((o) => o.value);
      const w = s.map((o) => o.weight);
      const estimate = harrellDavis(x, p, w);
      const scaled = harrellDavis(
        x,
        p,
        w.map((v) => v * factor),
      );
      const padded = harrellDavis([-5000, ...x, 5000], p, [0, ...w, 0]);
      const reversed = harrellDavis(x.toReversed(), p, w.toReversed());
      for (const same of [scaled, padded, reversed]) expect(Math.abs(same - estimate)).toBeLessThan(1e-11 * 2000);
    }),
  );
});

test("follows a change of unit and zero, and stays within the sample", () => {
  fc.assert(
    fc.property(sample, probability, (s, p) => {
      const x = s.map((o) => o.value);
      const w = s.map((o) => o.weight);
      const estimate = harrellDavis(x, p, w);
      expect(
        harrellDavis(
          x.map((v) => 1.8 * v + 32),
          p,
          w,
        ),
      ).toBeCloseTo(1.8 * estimate + 32, 8);
      expect(estimate).toBeGreaterThanOrEqual(Math.min(...x));
      expect(estimate).toBeLessThanOrEqual(Math.max(...x));
    }),
  );
});

test("never falls as p rises", () => {
  const { x, w } = weighted.samples.precip_by_group_size;
  const estimates = Array.from({ length: 101 }, (_, i) => harrellDavis(x, i / 100, w));
  expect(estimates).toEqual(estimates.toSorted((a, b) => a - b));
});

// An integer weight spreads over the order statistics of the expanded sample, but with the beta of Kish's n*.
test("integer weights equal the expanded sample read with the effective sample size", () => {
  const x = [2, 3, 5, 8];
  const w = [1, 4, 2, 3];
  const expanded = x.flatMap((value, i) => Array<number>(w[i]!).fill(value));
  const [a, b] = [(kishSampleSize(w) + 1) * 0.3, (kishSampleSize(w) + 1) * 0.7];
  const share = (j: number) => betaCdf(j / expanded.length, a, b);
  const expected = expanded.reduce((sum, value, j) => sum + (share(j + 1) - share(j)) * value, 0);
  expect(harrellDavis(x, 0.3, w)).toBeCloseTo(expected, 12);
});

test("integer weights are not repetitions: those would claim more observations than there are", () => {
  const x = [2, 3, 5, 8];
  const tripled = x.flatMap((value) => [value, value, value]);
  expect(harrellDavis(x, 0.9, [3, 3, 3, 3])).toBeCloseTo(harrellDavis(x, 0.9), 12);
  expect(Math.abs(harrellDavis(tripled, 0.9) - harrellDavis(x, 0.9))).toBeGreaterThan(0.1);
});

// Repeating the whole weighted sample k times leaves the shares and multiplies Kish's n* by k.
test("repeating a whole sample with its weights narrows the beta by the repetition alone", () => {
  const { x, w } = weighted.samples.precip_by_group_size;
  const ranked = x.map((value, i) => ({ value, weight: w[i]! })).sort((s, t) => s.value - t.value);
  const total = w.reduce((sum, v) => sum + v, 0);
  const size = 2 * kishSampleSize(w);
  let upTo = 0;
  const expected = ranked.reduce((sum, { value, weight }) => {
    const before = betaCdf(upTo / total, (size + 1) * 0.2, (size + 1) * 0.8);
    upTo += weight;
    return sum + (betaCdf(upTo / total, (size + 1) * 0.2, (size + 1) * 0.8) - before) * value;
  }, 0);
  expect(harrellDavis([...x, ...x], 0.2, [...w, ...w])).toBeCloseTo(expected, 10);
});

test("leaving out negligible parts of the beta keeps the full sum of 5000 values", () => {
  const x = Array.from({ length: 5000 }, (_, i) => Math.tan((i - 2499.5) / 1600));
  const cdf = betaCdf.factory(5001 * 0.3, 5001 * 0.7);
  const full = x.reduce((sum, value, i) => sum + (cdf((i + 1) / 5000) - cdf(i / 5000)) * value, 0);
  expect(harrellDavisSorted(x, undefined, 0.3)).toBeCloseTo(full, 12);
});

test("gives the limits at p = 0 and p = 1, near them too, and the one value there is", () => {
  expect(harrellDavis([4, 1, 9], 0)).toBe(1);
  expect(harrellDavis([4, 1, 9], 1)).toBe(9);
  expect(harrellDavis([4, 1, 9, 2], 1, [1, 2, 0, 3])).toBe(4);
  expect(harrellDavis([4, 1, 9, 2], 0, [1, 0, 1, 3])).toBe(2);
  expect(harrellDavis([4, 1, 9], 1e-12)).toBeCloseTo(1, 9);
  expect(harrellDavis([4, 1, 9], 1 - 1e-12)).toBeCloseTo(9, 9);
  expect(harrellDavis([6], 0.2)).toBe(6);
  expect(harrellDavis([6, 6, 6], 0.2, [1, 2, 3])).toBe(6);
});

test.each([
  [[], 0.5, undefined],
  [[1, Number.NaN], 0.5, undefined],
  [[1, Number.NEGATIVE_INFINITY], 0.5, undefined],
  [[1, 2], -0.1, undefined],
  [[1, 2], 1.1, undefined],
  [[1, 2], Number.NaN, undefined],
  [[1, 2], 0.5, [1]],
  [[1, 2], 0.5, [0, 0]],
  [[1, 2], 0.5, [1, -1]],
  [[1, 2], 0.5, [1, Number.NaN]],
])("refuses %j at %d with weights %j", (x, p, w) => {
  expect(() => harrellDavis(x, p, w)).toThrow(RangeError);
});

test("the sorted form refuses values out of order", () => {
  expect(() => harrellDavisSorted([2, 1], undefined, 0.5)).toThrow(RangeError);
});
