import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { defaultDisclosureParameters as rules } from "#shared/disclosure/parameters.ts";
import { releaseDistribution } from "#shared/disclosure/release-distribution.ts";
import { quantileLabels } from "#shared/disclosure/tails.ts";
import { rawDistribution } from "#shared/peers/distribution.ts";
import { drawInLoneExtremes } from "#shared/peers/lone-extremes.ts";
import { shopWeightedValues } from "#shared/peers/shop-weights.ts";
import { harrellDavis } from "#shared/stats/harrell-davis.ts";
import { edition1, makeContribution, makeShops } from "#tests/support/peer-factories.ts";

fc.configureGlobal({ seed: 20_260_101 });

const current = fc.double({ min: 10, max: 400, noNaN: true });
const feed = fc.double({ min: 50, max: 15_000, noNaN: true });

describe("shop weights", () => {
  test("a shop weighs one however many recipes it brings", () => {
    const many = Array.from({ length: 1000 }, (_, i) => makeContribution(1, { currentA: 90 }, { machine: i }));
    const values = shopWeightedValues("currentA", [...many, makeContribution(2, { currentA: 45 })]);
    const weightOf = (shop: number) => values.filter((v) => v.shop === shop).reduce((sum, v) => sum + v.weight, 0);
    expect(weightOf(1)).toBeCloseTo(1, 12);
    expect(weightOf(2)).toBe(1);
  });

  test("a recipe that leaves the metric empty takes no weight from its shop's others", () => {
    const values = shopWeightedValues("currentA", [
      makeContribution(1, { currentA: 45 }),
      makeContribution(1, { feedMmMin: 900 }),
    ]);
    expect(values).toEqual([{ shop: 1, value: 45, weight: 1 }]);
  });

  test("a shop with a thousand recipes moves the median no further than a shop with one and the neighbours' values", () => {
    const neighbours = makeShops("currentA", [40, 42, 44, 46]);
    const flood = Array.from({ length: 1000 }, (_, i) => makeContribution(9, { currentA: 400 }, { machine: i }));
    const { p50 } = rawDistribution("currentA", [...neighbours, ...flood])!.quantiles;
    expect(p50).toBeGreaterThan(40);
    expect(p50).toBeLessThan(46);
  });
});

describe("quantiles", () => {
  test("one recipe a shop gives the plain Harrell-Davis estimate", () => {
    const values = [38, 40, 41, 44, 45, 47, 50];
    expect(rawDistribution("currentA", makeShops("currentA", values))!.quantiles.p50).toBeCloseTo(
      harrellDavis(values, 0.5),
      10,
    );
  });

  test("feed is summarised on a log scale", () => {
    const values = [800, 1000, 1500, 2200, 3000];
    const logs = values.map(Math.log);
    expect(rawDistribution("feedMmMin", makeShops("feedMmMin", values))!.quantiles.p50).toBeCloseTo(
      Math.exp(harrellDavis(logs, 0.5)),
      6,
    );
  });

  test("no shop, no distribution", () => {
    expect(rawDistribution("currentA", [makeContribution(1)])).toBeNull();
  });

  test("one shop's wild value cannot carry a released median beyond its neighbours' range", () => {
    fc.assert(
      fc.property(fc.array(feed, { minLength: 4, maxLength: 25 }), feed, (neighbours, wild) => {
        const released = releaseDistribution(
          "feedMmMin",
          makeShops("feedMmMin", [...neighbours, wild]),
          rules,
          edition1,
        )!;
        const step = 1 + 5e-3; // three significant figures
        expect(released.quantiles.p50).toBeGreaterThanOrEqual(Math.min(...neighbours) / step);
        expect(released.quantiles.p50).toBeLessThanOrEqual(Math.max(...neighbours) * step);
      }),
      { numRuns: 500 },
    );
  });

  test("nor can it with many wild recipes", () => {
    fc.assert(
      fc.property(
        fc.array(current, { minLength: 4, maxLength: 12 }),
        fc.array(current, { minLength: 1, maxLength: 30 }),
        (neighbours, wild) => {
          const flood = wild.map((currentA, i) => makeContribution(99, { currentA }, { machine: i }));
          const released = releaseDistribution(
            "currentA",
            [...makeShops("currentA", neighbours), ...flood],
            rules,
            edition1,
          )!;
          expect(released.quantiles.p50).toBeGreaterThanOrEqual(Math.min(...neighbours) - 0.25);
          expect(released.quantiles.p50).toBeLessThanOrEqual(Math.max(...neighbours) + 0.25);
        },
      ),
      { numRuns: 500 },
    );
  });

  test("released quantiles never fall from one to the next", () => {
    fc.assert(
      fc.property(fc.array(current, { minLength: 5, maxLength: 40 }), (values) => {
        const { quantiles } = releaseDistribution("currentA", makeShops("currentA", values), rules, edition1)!;
        const shown = quantileLabels.flatMap((label) => quantiles[label] ?? []);
        expect(shown).toEqual([...shown].sort((a, b) => a - b));
      }),
    );
  });

  test("order of the contributions does not matter", () => {
    fc.assert(
      fc.property(fc.array(current, { minLength: 5, maxLength: 20 }), (values) => {
        const contributions = makeShops("currentA", values);
        expect(releaseDistribution("currentA", [...contributions].reverse(), rules, edition1)).toEqual(
          releaseDistribution("currentA", contributions, rules, edition1),
        );
      }),
    );
  });
});

describe("lone extremes", () => {
  const valuesOf = (numbers: number[]) => numbers.map((value, i) => ({ shop: i, value, weight: 1 }));

  test("one shop's slip of the keyboard is drawn in to its neighbours where they agree", () => {
    expect(drawInLoneExtremes(valuesOf([40, 40, 40, 40, 400])).map((v) => v.value)).toEqual([40, 40, 40, 40, 40]);
  });

  test("a tail that two shops share is left alone", () => {
    const values = valuesOf([45, 45, 45, 45, 45, 45, 45, 45, 65, 65]);
    expect(drawInLoneExtremes(values)).toEqual(values);
  });

  // Tukey (1977): the outer fence lies three interquartile ranges beyond the quartile; here 44 + 3 * (44 - 41) = 53.
  test("a value within the outer fence is left alone, one beyond it comes back to it", () => {
    expect(drawInLoneExtremes(valuesOf([40, 41, 42, 44, 53])).at(-1)?.value).toBe(53);
    expect(drawInLoneExtremes(valuesOf([40, 41, 42, 44, 90])).at(-1)?.value).toBe(53);
  });

  test("both sides are drawn in alike", () => {
    const up = drawInLoneExtremes(valuesOf([-44, -43, -41, -40, 300])).map((v) => v.value);
    const down = drawInLoneExtremes(valuesOf([44, 43, 41, 40, -300])).map((v) => -v.value);
    expect(down).toEqual(up);
  });

  test("a single shop is left as it is", () => {
    expect(drawInLoneExtremes(valuesOf([45]))).toEqual(valuesOf([45]));
  });
});
