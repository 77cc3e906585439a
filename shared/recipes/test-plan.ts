import type { StartingSetpoint, TestPlanStep } from "../contracts/starting-recipe-figures.ts";
import { roundForRelease } from "../disclosure/rounding.ts";
import type { Metric } from "./metrics.ts";
import { testThatFinds } from "./setpoint-tests.ts";

export interface TestPlanSubject {
  nozzleMm: number | null;
  setpoints: Record<Metric, StartingSetpoint>;
}

type PlannedStep = Omit<TestPlanStep, "order">;

const feedLevels = 5;

/**
 * Which coupons to cut, one setpoint at a time, in the order in which each settles what the next one leans on. Common
 * practice, no source: nozzle, current and pressure first; then pierce and feed at a fixed height; then the voltage of a
 * good cut, read while the height control only observes; then hold it and nudge it.
 */
export function testPlanFor(subject: TestPlanSubject): TestPlanStep[] {
  const steps = [
    consumables(subject),
    current(subject),
    pressure(subject),
    pierce(subject),
    feed(subject),
    ...voltage(),
    kerf(),
  ];
  return steps.map((step, i) => ({ order: i + 1, ...step }));
}

function consumables({ nozzleMm }: TestPlanSubject): PlannedStep {
  const nozzle =
    nozzleMm === null ? "the nozzle the torch maker's manual names" : `a sound ${nozzleMm.toFixed(1)} mm nozzle`;
  return {
    title: "Fit nozzle and electrode",
    varies: null,
    levels: [],
    coupons: 0,
    instruction: `Fit ${nozzle} and an electrode in good order. Keep both for the whole plan.`,
    keepWhen: "The orifice is round and the electrode's pit is shallow.",
  };
}

function current({ setpoints }: TestPlanSubject): PlannedStep {
  return {
    title: "Set the current",
    varies: "currentA",
    levels: levelOf(setpoints.currentA),
    coupons: 0,
    instruction: setpoints.currentA.value === null ? testThatFinds.currentA : "Set it and leave it for the whole plan.",
    keepWhen: "The power source holds it without a warning.",
  };
}

function pressure({ setpoints }: TestPlanSubject): PlannedStep {
  const { value } = setpoints.pressureBar;
  return {
    title: "Set the gas pressure",
    varies: "pressureBar",
    levels: levelOf(setpoints.pressureBar),
    coupons: 0,
    instruction:
      value === null
        ? testThatFinds.pressureBar
        : "Set it at the torch while the gas flows, not at rest. Drain the water trap.",
    keepWhen: "The gauge stays put for half a minute of flow.",
  };
}

function pierce({ setpoints }: TestPlanSubject): PlannedStep {
  return {
    title: "Settle the pierce",
    varies: "pierceDelayS",
    levels: levelOf(setpoints.pierceDelayS),
    coupons: 1,
    instruction: `Pierce several times in one coupon at the pierce height. ${testThatFinds.pierceDelayS}`,
    keepWhen: "It pierces clean three times running and nothing blows back on the nozzle.",
  };
}

function feed({ setpoints }: TestPlanSubject): PlannedStep {
  const levels = seriesOf(setpoints.feedMmMin);
  return {
    title: "Find the feed",
    varies: "feedMmMin",
    levels,
    coupons: feedLevels,
    instruction:
      levels.length === 0
        ? `Height control off, torch at the cut height. ${testThatFinds.feedMmMin}`
        : "Height control off, torch at the cut height: one straight line a coupon at each feed, slowest first.",
    keepWhen: "It has the least dross, drag lines that lean back only a little, and goes through to the end.",
  };
}

function voltage(): PlannedStep[] {
  return [
    {
      title: "Read the voltage of a good cut",
      varies: null,
      levels: [],
      coupons: 1,
      instruction:
        "Height control only observing, flat sheet, the feed found: cut a straight line and record the arc voltage. Take its average over the steady part.",
      keepWhen: "The cut is good from end to end and the voltage does not drift.",
    },
    {
      title: "Hold that voltage",
      varies: null,
      levels: [],
      coupons: 1,
      instruction: "Height control on, holding the average you read. Cut the same line.",
      keepWhen: "The torch neither climbs nor dives, and the cut looks as it did before.",
    },
    {
      title: "Nudge the voltage",
      varies: "arcVoltageV",
      levels: [],
      coupons: 4,
      instruction: "One coupon each at 1 V and 2 V above and below what you hold. Change nothing else.",
      keepWhen: "Of the five, it has the squarest edge and the least dross.",
    },
  ];
}

function kerf(): PlannedStep {
  return {
    title: "Measure the kerf and keep the recipe",
    varies: "kerfWidthMm",
    levels: [],
    coupons: 1,
    instruction: `${testThatFinds.kerfWidthMm} Record the cut as a test cut.`,
    keepWhen: "The test cut is acceptable: the recipe is proven.",
  };
}

function levelOf({ value }: StartingSetpoint): number[] {
  return value === null ? [] : [value];
}

/** Equal factors from the low to the high end of the range, slowest first. */
function seriesOf({ low, high }: StartingSetpoint): number[] {
  if (low === null || high === null) return [];
  const levels = Array.from({ length: feedLevels }, (_, i) =>
    roundForRelease("feedMmMin", low * (high / low) ** (i / (feedLevels - 1))),
  );
  return [...new Set(levels)];
}
