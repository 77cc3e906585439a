import type { StartingSetpoint } from "../contracts/starting-recipe-figures.ts";
import { roundForRelease } from "../disclosure/rounding.ts";
import type { Metric } from "./metrics.ts";
import { firstCutHeightMm, ruleOfThumb } from "./practice.ts";
import { testThatFinds } from "./setpoint-tests.ts";
import type { EstimateContext } from "./starting-input.ts";

/** A setpoint from a rule of thumb; null where none holds. */
export function practiceEstimate(metric: Metric, context: EstimateContext): StartingSetpoint | null {
  const { gas, nozzleMm, cutHeightMm } = context;
  if (nozzleMm === null) return null;
  const found = ruleOfThumb(metric, { gas, nozzleMm, cutHeightMm: cutHeightMm ?? firstCutHeightMm });
  if (found === null) return null;
  return {
    value: roundForRelease(metric, found.value),
    low: roundForRelease(metric, found.low),
    high: roundForRelease(metric, found.high),
    basis: "practice",
    evidence: "Common practice, no source",
    steps: [{ kind: "practice", text: `Common practice, no source: ${found.rule}.` }],
  };
}

/** A setpoint left empty, with the test that will find it. Feed says why it is the one to look for. */
export function noEstimate(metric: Metric): StartingSetpoint {
  const why = metric === "feedMmMin" ? "With the nozzle chosen, the feed alone follows thickness. " : "";
  return {
    value: null,
    low: null,
    high: null,
    basis: "none",
    evidence: "To be found by test",
    steps: [{ kind: "test", text: `${why}${testThatFinds[metric]}` }],
  };
}
