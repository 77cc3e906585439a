import { describe, expect, test } from "vitest";
import type { StartingSetpoint } from "#shared/contracts/starting-recipe-figures.ts";
import { TestPlanStep } from "#shared/contracts/starting-recipe-figures.ts";
import { type Metric, metrics } from "#shared/recipes/metrics.ts";
import { testPlanFor } from "#shared/recipes/test-plan.ts";

const none: StartingSetpoint = { value: null, low: null, high: null, basis: "none", evidence: "", steps: [] };
const setpoints = (known: Partial<Record<Metric, StartingSetpoint>>) =>
  ({ ...Object.fromEntries(metrics.map((metric) => [metric, none])), ...known }) as Record<Metric, StartingSetpoint>;
const feed: StartingSetpoint = { ...none, value: 2000, low: 1000, high: 4000, basis: "peers" };

describe("test plan", () => {
  const plan = testPlanFor({ nozzleMm: 0.8, setpoints: setpoints({ feedMmMin: feed }) });

  test("settles nozzle, current, pressure, pierce and feed before it reads, holds and nudges the voltage", () => {
    expect(plan.map((step) => step.title)).toEqual([
      "Fit nozzle and electrode",
      "Set the current",
      "Set the gas pressure",
      "Settle the pierce",
      "Find the feed",
      "Read the voltage of a good cut",
      "Hold that voltage",
      "Nudge the voltage",
      "Measure the kerf and keep the recipe",
    ]);
    expect(plan.map((step) => step.order)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9]);
    expect(plan.every((step) => TestPlanStep.safeParse(step).success)).toBe(true);
  });

  test("changes one setpoint at a time, each in one step only", () => {
    const varied = plan.flatMap((step) => step.varies ?? []);
    expect(new Set(varied).size).toBe(varied.length);
  });

  test("steps the feed through its range by equal factors, slowest first", () => {
    expect(plan[4]?.levels).toEqual([1000, 1410, 2000, 2830, 4000]); // 1000 · 4^(i/4) to three figures
  });

  test("where nothing is known each step says how to find it", () => {
    const blind = testPlanFor({ nozzleMm: null, setpoints: setpoints({}) });
    expect(blind.every((step) => step.levels.length === 0 && step.instruction.length > 0)).toBe(true);
    expect(blind[0]?.instruction).toContain("manual");
    expect(blind[4]?.instruction).toContain("no longer goes through");
  });
});
