import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { materials, processGases } from "#shared/materials/materials.ts";
import {
  bandIndexOf,
  bandLabel,
  bandLimitsMm,
  bandNominalMm,
  nozzleStep,
  parsePeerGroupId,
  peerGroupId,
  peerGroupOf,
} from "#shared/peers/peer-group.ts";

fc.configureGlobal({ seed: 20_260_101 });

// ISO 3, preferred numbers, basic series R10 between 1 and 10.
const iso3R10 = [1, 1.25, 1.6, 2, 2.5, 3.15, 4, 5, 6.3, 8];

describe("thickness bands", () => {
  test.each(iso3R10.flatMap((n) => [n / 10, n, n * 10]))("the ISO 3 number %d mm names its own band", (nominal) => {
    expect(bandNominalMm(bandIndexOf(nominal))).toBeCloseTo(nominal, 10);
  });

  test("one decade of bands is the ten numbers of ISO 3, in order", () => {
    expect(Array.from({ length: 10 }, (_, i) => bandNominalMm(i))).toEqual(iso3R10);
  });

  // 11 ga of the manufacturers' standard gauge for sheet steel: 5.000 lb/ft² (15 U.S.C. 206) over 41.82 = 0.1196 in.
  test.each([
    ["3 mm", 3, 3.15],
    ["11 ga", 0.1196 * 25.4, 3.15],
    ["1/8 in", 25.4 / 8, 3.15],
    ["6 mm", 6, 6.3],
    ["1/4 in", 25.4 / 4, 6.3],
  ])("%s lies in the band it is traded in", (_, thicknessMm, nominal) => {
    expect(bandNominalMm(bandIndexOf(thicknessMm))).toBe(nominal);
  });

  test("a thickness lies within the limits of its band, which join those of the next", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.4, max: 50, noNaN: true }), (thicknessMm) => {
        const band = bandIndexOf(thicknessMm);
        const { from, to } = bandLimitsMm(band);
        expect(thicknessMm).toBeGreaterThanOrEqual(from * (1 - 1e-12));
        expect(thicknessMm).toBeLessThanOrEqual(to * (1 + 1e-12));
        expect(bandLimitsMm(band + 1).from).toBe(to);
      }),
    );
  });

  test("just under 1 mm is band 0, not minus 0", () => {
    expect(Object.is(bandIndexOf(0.99), 0)).toBe(true);
  });

  test("is labelled with its preferred number", () => {
    expect(bandLabel(5)).toBe("3.15 mm band");
  });

  test.each([0, -3, Number.NaN, Number.POSITIVE_INFINITY])("refuses a thickness of %d mm", (thicknessMm) => {
    expect(() => bandIndexOf(thicknessMm)).toThrow(RangeError);
  });

  test("refuses half a band", () => {
    expect(() => bandNominalMm(2.5)).toThrow(RangeError);
  });
});

describe("group ids", () => {
  test("names material, band, nozzle and gas in letters a URL keeps", () => {
    const key = peerGroupOf({ material: "mild-steel", thicknessMm: 3, nozzleMm: 0.83, gas: "air" });
    expect(peerGroupId(key)).toBe("mild-steel_t3.15_n0.8_air");
    expect(encodeURIComponent(peerGroupId(key))).toBe(peerGroupId(key));
  });

  test("every key comes back from its id", () => {
    const subject = fc.record({
      material: fc.constantFrom(...materials),
      thicknessMm: fc.double({ min: 0.4, max: 50, noNaN: true }),
      nozzleMm: fc.double({ min: 0.4, max: 3, noNaN: true }),
      gas: fc.constantFrom(...processGases),
    });
    fc.assert(
      fc.property(subject, (recipe) => {
        const key = peerGroupOf(recipe);
        expect(parsePeerGroupId(peerGroupId(key))).toEqual(key);
      }),
    );
  });

  test.each([
    "",
    "mild-steel_t3.15_n0.8",
    "mild-steel_t3.1_n0.8_air",
    "mild-steel_t3.15_n0.80_air",
    "mild-steel_t0_n0.8_air",
    "lead_t3.15_n0.8_air",
    "mild-steel_t3.15_n0.8_steam",
    "mild-steel_t3.15_n0.8_air\n",
  ])("refuses %j, which is no id", (id) => {
    expect(parsePeerGroupId(id)).toBeNull();
  });

  test("nozzles a few hundredths apart share a group", () => {
    expect([0.76, 0.8, 0.84].map(nozzleStep)).toEqual([0.8, 0.8, 0.8]);
    expect([0.85, 2.55].map(nozzleStep), "as the typed decimal rounds, not its binary neighbour").toEqual([0.9, 2.6]);
  });
});
