import { describe, expect, test } from "vitest";
import { checkLimits, checkSetpoint, fieldLimits, type LimitedField } from "#shared/recipes/limits.ts";

// The limits themselves are common practice, no source; these tests hold what is said about them.

describe("one figure", () => {
  test.each([
    ["feedMmMin", 20_000, "metric", "Allowed: 50 to 15,000 mm/min."],
    ["currentA", 5, "inch", "Allowed: 10 to 400 A."],
    ["pressureBar", 65, "metric", "Allowed: 2 to 9 bar. If you meant 65 psi, type the unit too."],
    ["pressureBar", 450, "metric", "Allowed: 2 to 9 bar. If you meant 450 kPa, type the unit too."],
    ["feedMmMin", 40, "metric", "Allowed: 50 to 15,000 mm/min. If you meant 40 in/min or 40 mm/s, type the unit too."],
    ["thicknessMm", 3 * 25.4, "inch", "Allowed: 0.016 to 1.968 in. If you meant 3 mm, type the unit too."],
    ["pierceDelayS", 400, "metric", "Allowed: 0 to 10 s. If you meant 400 ms, type the unit too."],
  ] as const)("%s of %d is refused, %s: %s", (field, value, units, detail) => {
    expect(checkSetpoint(field, value, units)).toEqual({ kind: "refuse", detail });
  });

  test.each([
    [
      "feedMmMin",
      120,
      "metric",
      "Feed rate of 120 mm/min is seldom right. Usual: 150 to 12,000 mm/min. Did you mean 120 in/min or 120 mm/s?",
    ],
    ["arcVoltageV", 60, "metric", "Arc voltage of 60.0 V is seldom right. Usual: 70 to 180 V. Check it."],
  ] as const)("%s of %d is asked about, %s: %s", (field, value, units, detail) => {
    expect(checkSetpoint(field, value, units)).toEqual({ kind: "ask", detail });
  });

  test.each(Object.keys(fieldLimits) as LimitedField[])("%s may lie on its limits; NaN may not pass", (field) => {
    const { hard, soft } = fieldLimits[field];
    expect([soft.min, soft.max].map((value) => checkSetpoint(field, value, "metric").kind)).toEqual(["fine", "fine"]);
    const atHard = [hard.min, hard.max].map((value) => checkSetpoint(field, value, "inch").kind);
    expect(atHard).not.toContain("refuse");
    expect(checkSetpoint(field, Number.NaN, "metric").kind).toBe("refuse");
  });
});

describe("a recipe", () => {
  test("with usual figures raises nothing, and missing figures pass", () => {
    const figures = { thicknessMm: 3, nozzleMm: 1, currentA: 45, feedMmMin: 2800, arcVoltageV: null };
    expect(checkLimits(figures, "metric")).toEqual({ errors: [], questions: [] });
    expect(checkLimits({}, "metric")).toEqual({ errors: [], questions: [] });
  });

  test("is refused for some figures and asked about others, each by its field", () => {
    const { errors, questions } = checkLimits({ pressureBar: 65, feedMmMin: 120, nozzleMm: 1 }, "metric");
    expect(errors.map(({ field }) => field)).toEqual(["pressureBar"]);
    expect(questions.map(({ field }) => field)).toEqual(["feedMmMin"]);
  });

  test("may pierce at the cut height but not below it", () => {
    expect(checkLimits({ cutHeightMm: 1.5, pierceHeightMm: 1.5 }, "metric").errors).toEqual([]);
    expect(checkLimits({ cutHeightMm: 1.524, pierceHeightMm: 1.5 }, "inch").errors).toEqual([
      { field: "pierceHeightMm", detail: "Pierce height cannot be below cut height, 0.060 in" },
    ]);
  });
});
