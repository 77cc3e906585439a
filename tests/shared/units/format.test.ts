import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import {
  formatCount,
  formatPercent,
  formatQuantity,
  formatThickness,
  formatWithUnit,
  inchFraction,
  limitText,
  toDisplayNumber,
  unitLabel,
} from "#shared/units/format.ts";
import { parseQuantity } from "#shared/units/parse.ts";
import { unitSystems } from "#shared/units/units.ts";

test.each([
  [45, "current", "metric", "45 A"],
  [45.5, "current", "inch", "45.5 A"],
  [4.5, "pressure", "metric", "4.50 bar"],
  [4.48159224056, "pressure", "inch", "65 psi"],
  [4.5, "pressure", "inch", "65.3 psi"],
  [2450, "feed", "metric", "2,450 mm/min"],
  [2450, "feed", "inch", "96.5 in/min"],
  [3048, "feed", "inch", "120 in/min"],
  [1.5, "length", "metric", "1.50 mm"],
  [1.5, "length", "inch", "0.059 in"],
  [-0.001, "length", "metric", "0.00 mm"],
  [0.4, "delay", "metric", "0.40 s"],
  [103.5, "voltage", "inch", "103.5 V"],
  [104, "voltage", "metric", "104.0 V"],
  [1, "nozzle", "metric", "1.0 mm"],
  [1.1, "nozzle", "inch", "1.1 mm"],
  [3.2, "thickness", "metric", "3.2 mm"],
] as const)("shows %d %s, %s, as %s", (value, quantity, units, text) => {
  expect(formatWithUnit(value, quantity, units)).toBe(text);
});

test("gives figure and unit apart, so that a table can line them up", () => {
  expect(formatQuantity(2450, "feed", "metric")).toEqual({ text: "2,450", unit: "mm/min" });
  expect(unitLabel("pressure", "inch")).toBe("psi");
});

describe("thickness", () => {
  test.each([
    [3.2, "mild-steel", "metric", "3.2 mm"],
    [3.175, "mild-steel", "metric", "3.18 mm"],
    [6.35, "mild-steel", "inch", "1/4 in"],
    [31.75, "mild-steel", "inch", "1 1/4 in"],
    [25.4, "mild-steel", "inch", "1 in"],
    [3.175, "stainless-steel", "inch", "1/8 in (11 ga)"],
    [3.037, "mild-steel", "inch", "0.120 in (11 ga)"],
    [3.25, "mild-steel", "inch", "0.128 in"],
    [3.25, "copper", "inch", "0.128 in (8 ga)"],
  ] as const)("of %d mm %s reads, %s, %s", (mm, material, units, text) => {
    expect(formatThickness(mm, material, units)).toBe(text);
  });

  test("is a fraction within 0.02 mm of a 64th of an inch only", () => {
    expect([3.175 + 0.019, 3.175 - 0.019, 3.175 + 0.021].map((mm) => inchFraction(mm))).toEqual(["1/8", "1/8", null]);
    expect(inchFraction(0.01)).toBeNull();
  });
});

describe("limits", () => {
  test.each([
    ["currentA", "metric", "10 to 400 A"],
    ["feedMmMin", "metric", "50 to 15,000 mm/min"],
    ["feedMmMin", "inch", "2 to 590.5 in/min"],
    ["pressureBar", "inch", "29.1 to 130.5 psi"],
    ["cutHeightMm", "inch", "0.012 to 0.393 in"],
  ] as const)("of %s read, %s, %s", (metric, units, text) => {
    const { hard, quantity } = metricDefinitions[metric];
    expect(limitText(hard, quantity, units)).toBe(text);
  });

  test("name only values that are allowed", () => {
    for (const metric of metrics) {
      const { hard, quantity } = metricDefinitions[metric];
      for (const units of unitSystems) {
        const [from = "", to = ""] = limitText(hard, quantity, units).split(" to ");
        for (const end of [from, to]) {
          const parsed = parseQuantity(end, quantity, units);
          expect(parsed.ok && parsed.value >= hard.min && parsed.value <= hard.max).toBe(true);
        }
      }
    }
  });
});

test("an unrounded number typed back gives the stored value", () => {
  const quantities = metrics.map((metric) => metricDefinitions[metric].quantity);
  const value = fc.double({ min: 0.01, max: 20_000, noNaN: true });
  fc.assert(
    fc.property(value, fc.constantFrom(...quantities), fc.constantFrom(...unitSystems), (stored, quantity, units) => {
      const typed = parseQuantity(String(toDisplayNumber(stored, quantity, units)), quantity, units);
      expect(typed.ok && typed.value / stored).toBeCloseTo(1, 10); // what is typed is read to 12 significant digits
    }),
  );
});

test("counts and shares", () => {
  expect([formatCount(1512), formatCount(0), formatPercent(0.824), formatPercent(1)]).toEqual([
    "1,512",
    "0",
    "82 %",
    "100 %",
  ]);
});
