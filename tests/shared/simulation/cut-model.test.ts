import fc from "fast-check";
import { expect, test } from "vitest";
import { heatCheck } from "#shared/materials/heat-check.ts";
import { materials } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { idealSetpoints, usualNozzleMm } from "#shared/simulation/cut-model.ts";
import { simulateMachine, simulateRecipe } from "#shared/simulation/network.ts";
import { seededRandom } from "#shared/simulation/random.ts";
import { barPerPsi } from "#shared/units/units.ts";

// Common practice, no source: 0.6 mm about 30 A, 0.8 mm 40-45 A, 1.0 mm 50-55 A.
test.each([
  [0.6, 28, 33],
  [0.8, 40, 45],
  [1.0, 50, 55],
])("a %d mm nozzle carries %d to %d A", (nozzle, from, to) => {
  const { currentA } = idealSetpoints("mild-steel", 3, nozzle);
  expect(currentA).toBeGreaterThanOrEqual(from);
  expect(currentA).toBeLessThanOrEqual(to);
});

// Common practice, no source: below 1/8 in, from 1/8 to 1/4 in, above.
test.each([
  [2.5, 0.6],
  [3.175, 0.8],
  [6.35, 0.8],
  [8, 1],
])("%d mm sheet takes a %d mm nozzle", (thickness, nozzle) => {
  expect(usualNozzleMm(thickness)).toBe(nozzle);
});

// Common practice, no source: pressure is held whatever the thickness, feed alone follows it, first cut height 1/16 in.
test("pressure stands still and feed falls as the sheet grows", () => {
  const [thin, thick] = [idealSetpoints("mild-steel", 2, 0.8), idealSetpoints("mild-steel", 6, 0.8)];
  expect(thin.pressureBar).toBe(thick.pressureBar);
  expect(thin.pressureBar / barPerPsi).toBeGreaterThan(65);
  expect(thin.pressureBar / barPerPsi).toBeLessThan(70);
  expect(thick.feedMmMin).toBeLessThan(thin.feedMmMin);
  expect(thin.cutHeightMm).toBeCloseTo(25.4 / 16, 0);
});

test("every ideal cut passes the heat check and the hard limits", () => {
  const thickness = fc.double({ min: 0.8, max: 16, noNaN: true });
  fc.assert(
    fc.property(fc.constantFrom(...materials), thickness, (material, thicknessMm) => {
      const setpoints = idealSetpoints(material, thicknessMm, usualNozzleMm(thicknessMm));
      expect(heatCheck({ material, thicknessMm, ...setpoints })?.verdict).toBe("plausible");
      for (const metric of metrics) {
        const { min, max } = metricDefinitions[metric].hard;
        expect(setpoints[metric]).toBeGreaterThanOrEqual(min);
        expect(setpoints[metric]).toBeLessThanOrEqual(max);
      }
    }),
  );
});

test("simulated recipes keep to hard limits, the machine's top feed and a pierce above the cut", () => {
  fc.assert(
    fc.property(fc.integer(), fc.constantFrom("metric" as const, "inch" as const), (seed, habit) => {
      const random = seededRandom(seed);
      const machine = simulateMachine(random);
      const { setpoints } = simulateRecipe(random, machine, habit);
      for (const metric of metrics) {
        const value = setpoints[metric];
        if (value === null) continue;
        expect(value).toBeGreaterThanOrEqual(metricDefinitions[metric].hard.min);
        expect(value).toBeLessThanOrEqual(metricDefinitions[metric].hard.max);
      }
      expect(setpoints.feedMmMin).toBeLessThanOrEqual(machine.topFeedMmMin);
      if (setpoints.pierceHeightMm !== null && setpoints.cutHeightMm !== null) {
        expect(setpoints.pierceHeightMm).toBeGreaterThanOrEqual(setpoints.cutHeightMm);
      }
    }),
  );
});

test("the same seed gives the same stream, another seed another", () => {
  const stream = (seed: number) => Array.from({ length: 5 }, seededRandom(seed).next);
  expect(stream(3)).toEqual(stream(3));
  expect(stream(3)).not.toEqual(stream(4));
});

test("normal deviates have mean 0 and variance 1", () => {
  const random = seededRandom(1);
  const draws = Array.from({ length: 20_000 }, random.normal);
  const mean = draws.reduce((sum, x) => sum + x, 0) / draws.length;
  const variance = draws.reduce((sum, x) => sum + (x - mean) ** 2, 0) / draws.length;
  expect(Math.abs(mean)).toBeLessThan(4 / Math.sqrt(draws.length));
  expect(Math.abs(variance - 1)).toBeLessThan(4 * Math.sqrt(2 / draws.length));
});
