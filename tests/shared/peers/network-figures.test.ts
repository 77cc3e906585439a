import { describe, expect, test } from "vitest";
import { networkFigures } from "#shared/peers/network-figures.ts";
import { bandIndexOf, bandNominalMm } from "#shared/peers/peer-group.ts";
import { makeDistribution, makeGroup, someKey } from "#tests/support/peer-factories.ts";

const groupAt = (thicknessMm: number, nozzleMm: number, feedMmMin: number) => {
  const key = { ...someKey, bandIndex: bandIndexOf(thicknessMm), nozzleMm };
  return makeGroup({ feedMmMin: makeDistribution(feedMmMin, feedMmMin, feedMmMin) }, { key });
};

describe("thickness exponents", () => {
  test("an exact power law gives its exponent, whatever the level of each nozzle", () => {
    const law = (level: number, t: number) => level * bandNominalMm(bandIndexOf(t)) ** -1.3;
    const groups = [1.6, 2, 3.15]
      .map((t) => groupAt(t, 0.6, law(5000, t)))
      .concat([4, 6.3].map((t) => groupAt(t, 1, law(20_000, t))));
    expect(networkFigures(groups).exponents).toEqual([{ material: "mild-steel", metric: "feedMmMin", exponent: -1.3 }]);
  });

  test("a change of nozzle with thickness is not taken for a change with thickness", () => {
    const groups = [2, 2.5, 3.15, 4].map((t) => groupAt(t, 0.6, 3000)).concat([6.3, 8].map((t) => groupAt(t, 1, 1000)));
    expect(networkFigures(groups).exponents[0]?.exponent).toBe(0);
  });

  test("too few groups give none", () => {
    expect(networkFigures([groupAt(2, 0.6, 3000), groupAt(4, 0.6, 1500), groupAt(6.3, 0.6, 1000)]).exponents).toEqual(
      [],
    );
    expect(networkFigures([])).toEqual({ exponents: [] });
  });
});
