import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { metricDefinitions, metrics, nozzleRangeMm, thicknessRangeMm } from "#shared/recipes/metrics.ts";
import { editText } from "#shared/units/format.ts";
import { parseQuantity } from "#shared/units/parse.ts";
import { type TypedQuantity, unitSystems } from "#shared/units/units.ts";
import published from "../../data/unit-conversions.json" with { type: "json" };

function storedOf(text: string, quantity: TypedQuantity, units: "metric" | "inch" = "metric"): number {
  const parsed = parseQuantity(text, quantity, units, { material: "mild-steel" });
  if (!parsed.ok) throw new Error(`${text}: ${parsed.problem}`);
  return parsed.value;
}

function problemOf(text: string, quantity: TypedQuantity, units: "metric" | "inch" = "metric"): string {
  const parsed = parseQuantity(text, quantity, units);
  return parsed.ok ? `read as ${parsed.value}` : parsed.problem;
}

// NIST SP 811, appendix B.8, and the exact definitions behind it; to the twelve figures that are kept.
test.each(published.examples)("reads $typed as $stored", ({ typed, quantity, stored }) => {
  expect(storedOf(typed, quantity as TypedQuantity) / stored).toBeCloseTo(1, 11);
});

test("converts the other units by their exact factors", () => {
  const { psiToKPa, kgfCm2ToKPa, thouToMm } = published.factors;
  expect(storedOf("1 psi", "pressure") / storedOf("1 kPa", "pressure")).toBeCloseTo(psiToKPa, 9);
  expect(storedOf("5 kg/cm²", "pressure")).toBeCloseTo((5 * kgfCm2ToKPa) / 100, 9);
  expect(storedOf("60 thou", "length")).toBeCloseTo(60 * thouToMm, 12);
});

describe("thickness", () => {
  test.each([
    ["1/8", 3.175],
    ["1 1/2 in", 38.1],
    ['1-1/4"', 31.75],
    ["1½″", 38.1],
    ["¼ in", 6.35],
    ["3/16 inch", 4.7625],
    ["0.125 in", 3.175],
    ['.125"', 3.175],
    ["3.2mm", 3.2],
    ["3,2 mm", 3.2],
    ["12,700 mm", 12.7],
    ["0.3 cm", 3],
    [" 3 MM. ", 3],
  ])("reads %s as %d mm for every member", (text, mm) => {
    expect(unitSystems.map((units) => storedOf(text, "thickness", units))).toEqual([mm, mm]);
  });

  test("takes a bare thickness or nozzle in the member's unit", () => {
    expect([storedOf("3", "thickness", "metric"), storedOf("0.25", "thickness", "inch")]).toEqual([3, 6.35]);
    expect([storedOf("1.1", "nozzle", "metric"), storedOf("1.1", "nozzle", "inch")]).toEqual([1.1, 1.1]);
  });

  test.each(["11 ga", "11ga", "#11", "# 11", "11 gauge", "11 Gage", "11 ga."])("reads %s as a gauge", (text) => {
    // 15 U.S.C. 206: 5 lb/ft² at gauge 11; 41.82 lb/ft² per inch of sheet steel.
    expect(storedOf(text, "thickness")).toBeCloseTo((5 / 41.82) * 25.4, 3);
  });

  test("asks for the metal before it reads a gauge, and says which gauges there are", () => {
    expect(problemOf("11 ga", "thickness")).toBe("Choose the metal first: each has its own gauge numbers");
    expect(parseQuantity("7 ga", "thickness", "inch", { material: "galvanised-steel" })).toEqual({
      ok: false,
      problem: "Gauges of galvanised steel go from 8 to 26. Type the thickness itself",
    });
  });
});

describe("feed", () => {
  test.each([
    ["120 ipm", 3048],
    ["120 in/min", 3048],
    ["120 inches per minute", 3048],
    ['120"/min', 3048],
    ["2.4 m/min", 2400],
    ["2,4 m/min", 2400],
    ["2,400 m/min", 2400],
    ["2400 mm/min", 2400],
    ["2,400 mm/min", 2400],
    ["2 400 mm/min", 2400],
    ["2.400,5 mm/min", 2400.5],
    ["2,400.5", 2400.5],
    ["12,000", 12_000],
    ["12,5 mm/s", 750],
    ["40 mm/s", 2400],
    ["0,450 mm/min", 0.45],
  ])("reads %s as %d mm/min", (text, mmMin) => {
    expect(storedOf(text, "feed")).toBe(mmMin);
  });

  test("takes a bare feed in the member's unit", () => {
    expect([storedOf("2,400", "feed", "metric"), storedOf("100", "feed", "inch")]).toEqual([2400, 2540]);
  });

  test("takes one full stop as a decimal point, which no feed range lets pass", () => {
    expect(storedOf("2.400", "feed")).toBeLessThan(metricDefinitions.feedMmMin.hard.min);
  });
});

test.each([
  ["4.5 bar", "pressure", 4.5],
  ["450 kPa", "pressure", 4.5],
  ["0.45 MPa", "pressure", 0.45 * 10],
  ["65 PSIG", "pressure", 4.48159224056],
  ["45 A", "current", 45],
  ["45 amps", "current", 45],
  ["45,5", "current", 45.5],
  ["103.5 V", "voltage", 103.5],
  ["0.4 s", "delay", 0.4],
  ["400 ms", "delay", 0.4],
  ["1,250 ms", "delay", 1.25],
  ["0", "delay", 0],
] as const)("reads %s as %s", (text, quantity, stored) => {
  expect(storedOf(text, quantity)).toBe(stored);
});

test("takes a bare pressure in the member's unit", () => {
  expect([storedOf("4.5", "pressure", "metric"), storedOf("65", "pressure", "inch")]).toEqual([4.5, 4.48159224056]);
});

describe("refuses", () => {
  test.each([
    ["", "pressure", "Nothing typed. Type it like 4.5 bar"],
    ["  ", "thickness", "Nothing typed. Type it like 3 mm"],
    ["-5 A", "current", "This cannot be below zero"],
    ["−5 A", "current", "This cannot be below zero"],
    ["65 psi", "feed", "psi is a pressure. Type it like 2400 mm/min"],
    ["2400 mm", "feed", "mm is a length. Type it like 2400 mm/min"],
    ["45 V", "current", "V is a voltage. Type it like 45 A"],
    ["3 Furlongs", "thickness", "Furlongs is no unit known here. Type it like 3 mm"],
    ["3 constructor", "thickness", "constructor is no unit known here. Type it like 3 mm"],
    ["11 ga", "length", "A gauge number says sheet thickness, nothing else"],
    ["60 mil", "length", "A mil may be 0.001 in or a millimetre. Type thou, in or mm"],
    ["1/8 mm", "thickness", "A fraction is in inches. In another unit write a decimal, as 3.2 mm"],
    ["1/2 s", "delay", "A fraction is for inches only. Type it like 0.4 s"],
    ["45-50 A", "current", "Give one figure, not a range. Type it like 45 A"],
    ["45 to 50", "current", "Give one figure, not a range. Type it like 45 A"],
    ["1/0", "thickness", "Not clear. Type it like 3 mm"],
    ["1 125", "length", "Not clear. Type it like 1.5 mm"],
    ["3..2", "length", "Not clear. Type it like 1.5 mm"],
    ["1e3", "feed", "e3 is no unit known here. Type it like 2400 mm/min"],
    ["about 45", "current", "Not clear. Type it like 45 A"],
    ["Infinity", "current", "Not clear. Type it like 45 A"],
    ["9".repeat(400), "current", "Not clear. Type it like 45 A"],
  ] as const)("%j as %s", (text, quantity, problem) => {
    expect(problemOf(text, quantity)).toBe(problem);
  });

  test("with an example in the member's own unit", () => {
    expect(problemOf("?", "pressure", "inch")).toBe("Not clear. Type it like 65 psi");
  });
});

test("answers any text with a value of zero or more, or with a problem in words", () => {
  const quantities = ["current", "pressure", "feed", "length", "delay", "voltage", "thickness", "nozzle"] as const;
  const typing = fc.oneof(fc.string(), fc.stringMatching(/^[-#0-9 .,/]{0,8}(mm|in|"|psi|ga|mm\/min|s)?$/));
  fc.assert(
    fc.property(typing, fc.constantFrom(...quantities), fc.constantFrom(...unitSystems), (text, quantity, units) => {
      const parsed = parseQuantity(text, quantity, units, { material: "copper" });
      if (parsed.ok) {
        expect(Number.isFinite(parsed.value)).toBe(true);
        expect(parsed.value).toBeGreaterThanOrEqual(0);
      } else expect(parsed.problem).not.toBe("");
    }),
    { numRuns: 2000 },
  );
});

describe("what a field is filled with", () => {
  const figures = [
    ...metrics.map((metric) => ({
      quantity: metricDefinitions[metric].quantity,
      range: metricDefinitions[metric].hard,
    })),
    { quantity: "thickness", range: thicknessRangeMm } as const,
    { quantity: "nozzle", range: nozzleRangeMm } as const,
  ];

  test.each(figures)("gives the stored $quantity back in $range.min to $range.max", ({ quantity, range }) => {
    const noDust = (value: number) => value === 0 || value > 1e-9; // a nanosecond
    const value = fc.double({ ...range, noNaN: true }).filter(noDust);
    fc.assert(
      fc.property(value, fc.constantFrom(...unitSystems), (stored, units) => {
        const again = storedOf(editText(stored, quantity, units), quantity, units);
        expect(Math.abs(again - stored)).toBeLessThanOrEqual(1e-11 * stored);
      }),
    );
  });

  test("stays the very number that was typed, in whichever unit", () => {
    const tenths = fc.integer({ min: 300, max: 1300 }).map((n) => `${n / 10} psi`);
    fc.assert(
      fc.property(tenths, fc.constantFrom(...unitSystems), (typed, units) => {
        const stored = storedOf(typed, "pressure");
        expect(storedOf(editText(stored, "pressure", units), "pressure", units)).toBe(stored);
      }),
    );
  });

  test.each([
    [3.175, "thickness", "inch", "0.125"],
    [3.2, "thickness", "inch", "3.2 mm"],
    [3.2, "thickness", "metric", "3.2"],
    [1.5875, "length", "metric", "1.5875"],
    [2450, "feed", "inch", "2450 mm/min"],
    [3048, "feed", "inch", "120"],
    [4.48159224056, "pressure", "metric", "65 psi"],
    [0, "delay", "metric", "0"],
    [45.5, "current", "inch", "45.5"],
  ] as const)("is short for %d as %s, %s: %s", (stored, quantity, units, text) => {
    expect(editText(stored, quantity, units)).toBe(text);
  });
});
