import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type HeatCheckInput,
  heatCheck,
  meltHeatJKg,
  meltPowerW,
  plausibleRatio,
} from "#shared/materials/heat-check.ts";
import { materials } from "#shared/materials/materials.ts";
import { thermalProperties } from "#shared/materials/properties.ts";
import published from "../../data/thermophysical.json" with { type: "json" };

/** An ordinary cut, invented. */
const cut: HeatCheckInput = {
  material: "mild-steel",
  thicknessMm: 3,
  feedMmMin: 2800,
  kerfWidthMm: 1.5,
  currentA: 45,
  arcVoltageV: 118,
};

describe("properties", () => {
  test.each([
    ["mild-steel", "Fe"],
    ["aluminium", "Al"],
    ["copper", "Cu"],
  ] as const)("of %s take up what NASA TM-4513 gives for %s from 298.15 K to liquid", (material, element) => {
    const { meanSolidSpecificHeatJKgK: c, heatOfFusionJKg } = thermalProperties[material];
    const { meltingK, total298ToLiquidJG } = published.elements[element];
    // At the pure element's melting point; the properties carry four figures.
    expect((c * (meltingK - 298.15) + heatOfFusionJKg) / 1000 / total298ToLiquidJG).toBeCloseTo(1, 3);
  });

  test("of brass take the copper and zinc of TM-4513 by mass, 70 to 30", () => {
    const { Cu, Zn } = published.elements;
    const mixed = 700 * Cu.meanSolidSpecificHeatJGK + 300 * Zn.meanSolidSpecificHeatJGK;
    expect(Math.abs(thermalProperties.brass.meanSolidSpecificHeatJKgK - mixed)).toBeLessThan(1);
  });

  test("of galvanised steel are those of mild steel", () => {
    expect(thermalProperties["galvanised-steel"]).toEqual(thermalProperties["mild-steel"]);
  });
});

describe("melt power", () => {
  // The balance worked by hand for given properties: P = volume a second × density × heat, over an assumed efficiency.
  const workedFor = { "mild steel": "mild-steel", aluminium: "aluminium", stainless: "stainless-steel" } as const;

  test.each(published.worked)("of the worked cut in $name differs by its properties alone", (worked) => {
    const material = workedFor[worked.name as keyof typeof workedFor];
    const power = meltPowerW(material, worked.thicknessMm, worked.kerfMm, worked.feedMmMin);
    const byHand = worked.powerW * worked.efficiency;
    const heatByHand = worked.specificHeatJKgK * worked.riseK + worked.fusionJKg;
    const properties =
      (thermalProperties[material].densityKgM3 * meltHeatJKg(material)) / (worked.densityKgM3 * heatByHand);
    expect(power / byHand).toBeCloseTo(properties, 9);
    expect(power / byHand).toBeGreaterThan(0.95);
    expect(power / byHand).toBeLessThan(1.05);
  });

  test.each([
    [0, 1.5, 2800],
    [3, -1, 2800],
    [3, 1.5, Number.NaN],
  ])("refuses thickness %d, kerf %d, feed %d", (thickness, kerf, feed) => {
    expect(() => meltPowerW("brass", thickness, kerf, feed)).toThrow(RangeError);
  });

  test("grows in proportion to feed, thickness and kerf", () => {
    const factor = fc.double({ min: 0.1, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...materials), factor, (material, k) => {
        const once = meltPowerW(material, 3, 1.5, 2800);
        expect(meltPowerW(material, 3 * k, 1.5, 2800) / once).toBeCloseTo(k, 9);
        expect(meltPowerW(material, 3, 1.5 * k, 2800) / once).toBeCloseTo(k, 9);
        expect(meltPowerW(material, 3, 1.5, 2800 * k) / once).toBeCloseTo(k, 9);
      }),
    );
  });
});

describe("heat check", () => {
  test("finds an ordinary cut plausible and says both powers", () => {
    const check = heatCheck(cut)!; // nothing is missing
    expect(check.verdict).toBe("plausible");
    expect(check.arcPowerW).toBe(45 * 118);
    expect(check.ratio).toBeCloseTo(check.meltPowerW / (45 * 118), 12);
    expect(check.words).toBe(
      "Melting this kerf takes 2.1 kW, the arc gives 5.3 kW: 39 % of it, as in an ordinary cut.",
    );
  });

  // Common practice, no source: cuts shops make every day, quick, slow, thin and thick.
  test.each([
    ["thin mild steel, quick", { thicknessMm: 1.5, feedMmMin: 9000, kerfWidthMm: 1.1 }],
    ["plate", { thicknessMm: 12, feedMmMin: 1500, kerfWidthMm: 2.3, currentA: 105, arcVoltageV: 140 }],
    ["aluminium", { material: "aluminium", feedMmMin: 4000 }],
    ["aluminium, slow", { material: "aluminium", feedMmMin: 2000 }],
    ["copper", { material: "copper", feedMmMin: 1500 }],
  ] satisfies [string, Partial<HeatCheckInput>][])("finds %s plausible", (_, change) => {
    expect(heatCheck({ ...cut, ...change })?.verdict).toBe("plausible");
  });

  test.each([
    ["mm/s typed for mm/min", { feedMmMin: 2800 / 60 }, "low", "Was the feed meant in mm/s?"],
    ["in/min typed for mm/min", { feedMmMin: 110 }, "low", "Was the feed meant in in/min?"],
    ["inches typed for mm", { thicknessMm: 0.5, feedMmMin: 500 }, "low", "Was the thickness meant in inches?"],
    ["mm typed for inches", { thicknessMm: 25.4 }, "impossible", "Was the thickness meant in mm, not inches?"],
    ["mm/min typed for in/min", { feedMmMin: 300 * 25.4 }, "impossible", "Was the feed meant in mm/min, not in/min?"],
    ["a digit too many", { feedMmMin: 11_000 }, "impossible", "Has the feed a digit too many?"],
  ] as const)("catches %s", (slip, change, verdict, words) => {
    // 7,620 mm/min is itself a feed for thin sheet, so the slip shows in thick metal.
    const thick = slip === "mm/min typed for in/min" ? { thicknessMm: 25 } : {};
    const check = heatCheck({ ...cut, ...change, ...thick });
    expect(check?.verdict).toBe(verdict);
    expect(check?.words).toContain(words);
  });

  test("no slip between inches and millimetres leads from plausible to plausible", () => {
    const ratio = fc.double({ ...plausibleRatio, noNaN: true });
    fc.assert(
      fc.property(ratio, fc.constantFrom(25.4, 1 / 25.4, 1 / 60), (before, slip) => {
        const perFeed = heatCheck(cut)!.ratio / 2800; // nothing is missing
        const slipped = heatCheck({ ...cut, feedMmMin: (before / perFeed) * slip });
        expect(["low", "impossible"]).toContain(slipped?.verdict);
      }),
    );
  });

  test("calls it high where little is left for losses, impossible above the arc's whole power", () => {
    const perFeed = heatCheck(cut)!.ratio / 2800; // nothing is missing
    expect(heatCheck({ ...cut, feedMmMin: 0.9 / perFeed })?.verdict).toBe("high");
    expect(heatCheck({ ...cut, feedMmMin: 1.01 / perFeed })?.verdict).toBe("impossible");
  });

  test("allows for the heat of burning iron under oxygen, in steel only", () => {
    const quick = { ...cut, gas: "oxygen", feedMmMin: 9000 } as const;
    expect(heatCheck(quick)?.verdict).toBe("plausible");
    expect(heatCheck({ ...quick, gas: "air" })?.verdict).toBe("impossible");
    expect(heatCheck({ ...quick, material: "stainless-steel" })?.verdict).toBe("impossible");
  });

  test.each(["thicknessMm", "feedMmMin", "kerfWidthMm", "currentA", "arcVoltageV"] as const)(
    "says nothing without %s, or with a zero or a NaN there",
    (field) => {
      expect([null, 0, Number.NaN].map((value) => heatCheck({ ...cut, [field]: value }))).toEqual([null, null, null]);
    },
  );
});
