import { describe, expect, test } from "vitest";
import { practiceNozzleMm, ruleOfThumb } from "#shared/recipes/practice.ts";
import { quartileStretch } from "#shared/recipes/prediction-interval.ts";

const inch = 25.4;
const psi = 0.0689476; // bar

// Trade facts below: common practice, no source.
describe("nozzle by thickness", () => {
  test.each([
    ["22 ga", 0.76, 0.6],
    ["14 ga", 1.9, 0.6],
    ["2.5 mm", 2.5, 0.6],
    ["1/8 in", inch / 8, 0.8],
    ["3/16 in", (3 * inch) / 16, 0.8],
    ["1/4 in", inch / 4, 0.8],
    ["3/8 in", (3 * inch) / 8, 1],
    ["1/2 in", inch / 2, 1],
  ])("%s takes its usual nozzle", (_, thicknessMm, nozzleMm) => {
    expect(practiceNozzleMm(thicknessMm)).toBe(nozzleMm);
  });
});

describe("rules of thumb", () => {
  const air = (nozzleMm: number) => ({ gas: "air", nozzleMm, cutHeightMm: 1.6 }) as const;

  test.each([
    [0.6, 30, 30],
    [0.8, 40, 45],
    [1, 50, 55],
  ])("a %d mm nozzle runs at %d to %d A", (nozzleMm, from, to) => {
    const { value, low, high } = ruleOfThumb("currentA", air(nozzleMm))!;
    expect(value).toBe((from + to) / 2);
    expect(low).toBeLessThanOrEqual(from);
    expect(high).toBeGreaterThanOrEqual(to);
  });

  test("a nozzle between two known ones lies between their currents, one beyond them is not guessed", () => {
    expect(ruleOfThumb("currentA", air(0.7))!.value).toBeCloseTo((30 + 42.5) / 2, 10);
    expect(ruleOfThumb("currentA", air(0.9))!.value).toBeCloseTo((42.5 + 52.5) / 2, 10);
    expect(ruleOfThumb("currentA", air(0.5))).toBeNull();
    expect(ruleOfThumb("currentA", air(1.2))).toBeNull();
  });

  test("pressure is 65 to 70 psi", () => {
    const { low, high } = ruleOfThumb("pressureBar", air(0.8))!;
    expect(low / psi).toBeCloseTo(65, 3);
    expect(high / psi).toBeCloseTo(70, 3);
  });

  test("the first cut height is about 1/16 in, the pierce height 2 to 2.5 times the cut height", () => {
    expect(ruleOfThumb("cutHeightMm", air(0.8))!.value).toBeCloseTo(inch / 16, 1);
    expect(ruleOfThumb("pierceHeightMm", air(0.8))).toMatchObject({ low: 3.2, high: 4 });
    expect(ruleOfThumb("pierceHeightMm", { ...air(0.8), cutHeightMm: 3 })).toMatchObject({ low: 6, high: 7.5 });
  });

  test.each(["feedMmMin", "pierceDelayS", "arcVoltageV", "kerfWidthMm"] as const)("there is none for %s", (metric) => {
    expect(ruleOfThumb(metric, air(0.8))).toBeNull();
  });

  test("they hold for air alone", () => {
    expect(ruleOfThumb("currentA", { ...air(0.8), gas: "nitrogen" })).toBeNull();
  });
});

describe("80 % prediction interval from quartiles", () => {
  // Large groups tend to the normal distribution's own ratio of its 0.9 quantile to its quartile: 1.2816/0.6745 = 1.900.
  test("reaches further the fewer shops there are, and comes down towards 1.9", () => {
    const reach = (["3-4", "5-9", "10-19", "20-49", "50+"] as const).map(quartileStretch);
    expect(reach).toEqual([...reach].sort((a, b) => b - a));
    expect(reach.at(-1)).toBeGreaterThan(1.9);
    expect(reach.at(-1)).toBeLessThan(1.95);
  });

  // Student's t, 0.9 quantile at 6 degrees of freedom 1.440 (NIST/SEMATECH e-Handbook 1.3.6.7.2), seven shops.
  test("for seven shops it is 1.440 · sqrt(8/7) / 0.6745", () => {
    expect(quartileStretch("5-9")).toBeCloseTo((1.44 * Math.sqrt(8 / 7)) / 0.6745, 10);
  });
});
