import { expect, test } from "vitest";
import type { Standing } from "#shared/peers/standing.ts";
import { standingSentence } from "#shared/peers/standing-sentence.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";

const inside = (percentile: number): Standing => ({
  percentile,
  position: "inside",
  edge: null,
  robustZ: 0,
  word: "typical",
});
const outside = (position: "below" | "above", edge: "p10" | "p75" | "p25" | "p95"): Standing => ({
  percentile: null,
  position,
  edge,
  robustZ: 0,
  word: "high",
});

test.each([
  ["feedMmMin", 2450, inside(82), "is quicker than most: about 82 % of peers cut slower."],
  ["feedMmMin", 900, inside(12), "is slower than most: about 88 % of peers cut quicker."],
  ["arcVoltageV", 120, inside(50), "is near the middle: about 50 % of peers hold less voltage."],
  ["cutHeightMm", 1, outside("below", "p10"), "is below p10: fewer than 10 % of peers cut closer."],
  ["currentA", 80, outside("above", "p95"), "is above p95: fewer than 5 % of peers use more current."],
  ["pierceDelayS", 1.5, outside("above", "p75"), "is above p75: fewer than a quarter of peers wait longer."],
] as const)("%s %d in a sentence", (metric, value, standing, sentence) => {
  expect(standingSentence(metric, value, standing, "metric")).toBe(
    `Your ${formatWithUnit(value, metricDefinitions[metric].quantity, "metric")} ${sentence}`,
  );
});

test("speaks in the member's units", () => {
  expect(standingSentence("feedMmMin", 2540, inside(82), "inch")).toMatch(/^Your 100(\.0)? in\/min is quicker/);
});
