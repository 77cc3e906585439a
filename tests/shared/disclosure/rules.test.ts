import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { acceptableShare } from "#shared/disclosure/acceptable-share.ts";
import { countBandOf } from "#shared/disclosure/count-bands.ts";
import { DisclosureParameters, defaultDisclosureParameters as rules } from "#shared/disclosure/parameters.ts";
import { meetsQuorum } from "#shared/disclosure/quorum.ts";
import { releaseDistribution } from "#shared/disclosure/release-distribution.ts";
import { roundForRelease, roundingStep, roundSetpoints } from "#shared/disclosure/rounding.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { edition1, makeContribution, makeSetpoints, makeShops } from "#tests/support/peer-factories.ts";

fc.configureGlobal({ seed: 20_260_101 });

const spreadOut = (shops: number) =>
  makeShops(
    "currentA",
    Array.from({ length: shops }, (_, i) => 30 + i),
  );

// The rules follow: threshold rule, FCSM Statistical Policy Working Paper 22; dominance and differencing, Hundepool et
// al., Handbook on Statistical Disclosure Control; at least 10 contributors behind outer quantiles, ABS DataLab output
// rules (from memory).
describe("parameters", () => {
  test("default to the network's published rules", () => {
    expect(rules).toEqual({
      quorum: 5,
      tailsFrom: 10,
      farTailsFrom: 20,
      changedShops: 3,
      heldEditions: 2,
      listingShops: 3,
      traitShops: 5,
    });
  });

  test.each([
    { quorum: 2 },
    { quorum: 4.5 },
    { changedShops: 2 },
    { listingShops: 1 },
    { traitShops: 2 },
    { heldEditions: 3 },
  ])("refuse %j", (loosened) => {
    expect(DisclosureParameters.safeParse(loosened).success).toBe(false);
  });

  test("refuse tails that need fewer shops than the quorum, and far tails that need fewer than tails", () => {
    expect(DisclosureParameters.safeParse({ quorum: 12 }).success).toBe(false);
    expect(DisclosureParameters.safeParse({ tailsFrom: 25 }).success).toBe(false);
    expect(DisclosureParameters.safeParse({ quorum: 12, tailsFrom: 12 }).success).toBe(true);
  });

  test("a quorum of three is the loosest there is", () => {
    expect(DisclosureParameters.parse({ quorum: 3 }).quorum).toBe(3);
  });
});

describe("quorum", () => {
  test("counts shops, not recipes", () => {
    const oneShop = Array.from({ length: 50 }, (_, i) => makeContribution(1, { currentA: 45 }, { machine: i }));
    expect(meetsQuorum(oneShop, rules)).toBe(false);
  });

  test("holds from five shops on", () => {
    expect(meetsQuorum(spreadOut(4), rules)).toBe(false);
    expect(meetsQuorum(spreadOut(5), rules)).toBe(true);
  });

  test("is asked of each metric by itself", () => {
    const contributions = spreadOut(9).map((c, i) => ({
      ...c,
      setpoints: { ...c.setpoints, kerfWidthMm: i < 4 ? 1.5 : null },
    }));
    expect(releaseDistribution("kerfWidthMm", contributions, rules, edition1)).toBeNull();
    expect(releaseDistribution("currentA", contributions, rules, edition1)).not.toBeNull();
  });

  test("a network that lowers it to three shows a group of three", () => {
    const lowered = DisclosureParameters.parse({ quorum: 3 });
    expect(releaseDistribution("currentA", spreadOut(3), lowered, edition1)?.shops).toBe("3-4");
    expect(releaseDistribution("currentA", spreadOut(3), rules, edition1)).toBeNull();
  });
});

describe("tails", () => {
  const shownFor = (shops: number, parameters = rules) => {
    const released = releaseDistribution("currentA", spreadOut(shops), parameters, edition1)!;
    const labels = Object.entries(released.quantiles).flatMap(([label, value]) => (value === null ? [] : [label]));
    return { labels: labels.join(" "), density: released.density !== null };
  };

  test.each([
    [5, "p25 p50 p75", false],
    [9, "p25 p50 p75", false],
    [10, "p10 p25 p50 p75 p90", true],
    [19, "p10 p25 p50 p75 p90", true],
    [20, "p5 p10 p25 p50 p75 p90 p95", true],
  ])("%d shops show %s, density %s", (shops, labels, density) => {
    expect(shownFor(shops)).toEqual({ labels, density });
  });

  test("a network that needs thirty for the tails keeps them back from twenty", () => {
    expect(shownFor(20, DisclosureParameters.parse({ tailsFrom: 30, farTailsFrom: 40 })).labels).toBe("p25 p50 p75");
  });

  test("the density ends near p10 and p90, not at the smallest and largest value", () => {
    const values = [...Array.from({ length: 28 }, (_, i) => 40 + (i % 8)), 20, 20, 90, 90];
    const { density, quantiles } = releaseDistribution("currentA", makeShops("currentA", values), rules, edition1)!;
    expect(density!.from).toBeGreaterThan(22);
    expect(density!.to).toBeLessThan(88);
    expect(density!.from).toBeLessThan(quantiles.p10!);
    expect(density!.to).toBeGreaterThan(quantiles.p90!);
  });

  test("density heights keep two figures and top out at one", () => {
    const { density } = releaseDistribution("currentA", spreadOut(25), rules, edition1)!;
    expect(density!.heights.every((h) => h === Number(h.toPrecision(2)))).toBe(true);
    expect(Math.max(...density!.heights)).toBe(1);
    expect(density!.logScale).toBe(false);
  });

  test("a density stands where nearly all shops set the same, and for delays of zero", () => {
    const same = releaseDistribution("currentA", makeShops("currentA", Array(12).fill(45)), rules, edition1)!;
    expect(same.density!.heights.every(Number.isFinite)).toBe(true);
    const delays = releaseDistribution(
      "pierceDelayS",
      makeShops("pierceDelayS", [...Array(9).fill(0), 0.2, 0.3, 0.5]),
      rules,
      edition1,
    )!;
    expect(delays.density!.from).toBe(0);
  });
});

describe("bands for counts", () => {
  test.each([
    [5, "5-9"],
    [9, "5-9"],
    [10, "10-19"],
    [19, "10-19"],
    [20, "20-49"],
    [49, "20-49"],
    [50, "50+"],
    [5000, "50+"],
  ])("%d is told as %s", (count, band) => {
    expect(countBandOf(count)).toBe(band);
  });

  test.each([2, 0, 5.5])("refuses %d, which is never told", (count) => {
    expect(() => countBandOf(count)).toThrow(RangeError);
  });
});

describe("rounding", () => {
  test.each([
    ["currentA", 45.26, 45.5],
    ["pressureBar", 4.676, 4.7],
    ["feedMmMin", 2456, 2460],
    ["feedMmMin", 13_449, 13_400],
    ["feedMmMin", 857.4, 857],
    ["cutHeightMm", 1.587, 1.6],
    ["pierceHeightMm", 3.81, 3.8],
    ["pierceDelayS", 0.33, 0.35],
    ["arcVoltageV", 118.7, 118.5],
    ["kerfWidthMm", 1.47, 1.45],
  ] as const)("%s %d leaves as %d", (metric, value, rounded) => {
    expect(roundForRelease(metric, value)).toBe(rounded);
  });

  test("never turns the order of two values round, and moves none by more than its step", () => {
    const pair = fc.constantFrom(...metrics).chain((metric) => {
      const value = fc.double({ ...metricDefinitions[metric].hard, noNaN: true });
      return fc.tuple(fc.constant(metric), value, value);
    });
    fc.assert(
      fc.property(pair, ([metric, a, b]) => {
        expect(roundForRelease(metric, Math.min(a, b))).toBeLessThanOrEqual(roundForRelease(metric, Math.max(a, b)));
        expect(Math.abs(roundForRelease(metric, a) - a)).toBeLessThanOrEqual(0.5001 * roundingStep(metric, a));
      }),
    );
  });

  test("leaves empty setpoints empty", () => {
    expect(roundSetpoints(makeSetpoints({ currentA: 45.3 }))).toEqual(makeSetpoints({ currentA: 45.5 }));
  });

  test("a spread is never under one rounding step", () => {
    expect(releaseDistribution("currentA", makeShops("currentA", [45, 45, 45, 45, 45]), rules, edition1)?.spread).toBe(
      0.5,
    );
  });
});

describe("share of acceptable cuts", () => {
  const cuts = (shop: number, acceptedCuts: number, testCuts: number) =>
    makeContribution(shop, {}, { acceptedCuts, testCuts });

  test("each shop counts alike, and the share is told to 5 %", () => {
    // (0.5 + 0.5 + 0.5 + 1 + 0.9)/5 = 0.68; pooled over cuts it would be 0.9
    const shops = [cuts(1, 1, 2), cuts(2, 1, 2), cuts(3, 1, 2), cuts(4, 1, 1), cuts(5, 900, 1000)];
    expect(acceptableShare(shops, rules)).toBe(0.7);
  });

  test("is never told as all or none", () => {
    expect(
      acceptableShare(
        [1, 2, 3, 4, 5].map((s) => cuts(s, 3, 3)),
        rules,
      ),
    ).toBe(0.95);
    expect(
      acceptableShare(
        [1, 2, 3, 4, 5].map((s) => cuts(s, 0, 3)),
        rules,
      ),
    ).toBe(0.05);
  });

  test("needs a quorum of shops with test cuts", () => {
    expect(acceptableShare([...[1, 2, 3, 4].map((s) => cuts(s, 1, 1)), cuts(5, 0, 0)], rules)).toBeNull();
  });
});
