import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { standingOf } from "#shared/peers/standing.ts";
import { makeDistribution } from "#tests/support/peer-factories.ts";

fc.configureGlobal({ seed: 20_260_101 });

const withTails = makeDistribution(40, 45, 50, {
  shops: "10-19",
  quantiles: { p5: null, p10: 35, p25: 40, p50: 45, p75: 50, p90: 60, p95: null },
});

describe("standing", () => {
  test.each([
    [35, 10],
    [40, 25],
    [45, 50],
    [50, 75],
    [60, 90],
  ])("a value on a released quantile, %d A, stands at that per cent, %d", (value, percentile) => {
    expect(standingOf("currentA", value, withTails)).toMatchObject({ percentile, position: "inside", edge: null });
  });

  test("outside the released quantiles it names the outermost and gives no per cent", () => {
    expect(standingOf("currentA", 34.5, withTails)).toMatchObject({ percentile: null, position: "below", edge: "p10" });
    expect(standingOf("currentA", 61, withTails)).toMatchObject({ percentile: null, position: "above", edge: "p90" });
    expect(standingOf("currentA", 51, makeDistribution(40, 45, 50))).toMatchObject({ percentile: null, edge: "p75" });
  });

  test("quantiles that rounding made equal put a value in the middle of what they cover", () => {
    expect(standingOf("currentA", 45, makeDistribution(45, 45, 45, { spread: 0.5 })).percentile).toBe(50);
    expect(standingOf("currentA", 45, makeDistribution(45, 45, 50)).percentile).toBe(38); // between 25 and 50: 37.5
  });

  test("the per cent never falls as the value rises", () => {
    const quantiles = fc
      .array(fc.integer({ min: 20, max: 200 }), { minLength: 5, maxLength: 5 })
      .map((a) => a.sort((x, y) => x - y));
    const value = fc.double({ min: 20, max: 200, noNaN: true });
    fc.assert(
      fc.property(quantiles, value, value, (q, a, b) => {
        const [p10, p25, p50, p75, p90] = q as [number, number, number, number, number];
        const group = makeDistribution(p25, p50, p75, {
          spread: 1,
          quantiles: { p5: null, p10, p25, p50, p75, p90, p95: null },
        });
        const rank = (v: number) => {
          const { percentile, position } = standingOf("currentA", v, group);
          return percentile ?? (position === "below" ? -1 : 101);
        };
        expect(rank(Math.min(a, b))).toBeLessThanOrEqual(rank(Math.max(a, b)));
      }),
      { numRuns: 500 },
    );
  });

  // Spread 10/1.349 = 7.413 A: one spread above the median is 52.41 A, two are 59.83 A.
  test.each([
    [52, "typical"],
    [53, "high"],
    [59.5, "high"],
    [60, "unusually high"],
    [38, "typical"],
    [37, "low"],
    [30, "unusually low"],
  ])("%d A in words: %s", (value, word) => {
    expect(standingOf("currentA", value, withTails).word).toBe(word);
  });

  test("for feed, equal factors are equal distances", () => {
    const feeds = makeDistribution(1000, 2000, 4000, { spread: Math.log(4) / 1.349 });
    expect(standingOf("feedMmMin", 4000, feeds).robustZ).toBeCloseTo(-standingOf("feedMmMin", 1000, feeds).robustZ, 12);
  });

  test("refuses a value that is no number", () => {
    expect(() => standingOf("currentA", Number.NaN, withTails)).toThrow(RangeError);
  });
});
