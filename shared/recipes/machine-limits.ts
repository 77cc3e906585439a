import type { LimitHit, StartingSetpoint } from "../contracts/starting-recipe-figures.ts";
import { roundForRelease } from "../disclosure/rounding.ts";
import { formatWithUnit } from "../units/format.ts";
import type { UnitSystem } from "../units/units.ts";
import type { Metric } from "./metrics.ts";
import type { MachineLimits } from "./starting-input.ts";

type StartingSetpoints = Record<Metric, StartingSetpoint>;

interface Bent {
  setpoints: StartingSetpoints;
  limits: LimitHit[];
}

/**
 * Bends a starting recipe to what the machine can do, and says so wherever it does. Less current means less heat, so the
 * feed is slowed in proportion to it first, and held to the table's top feed after.
 */
export function applyMachineLimits(setpoints: StartingSetpoints, machine: MachineLimits, units: UnitSystem): Bent {
  const { powerSourceMaxCurrentA, topFeedMmMin, torchPressureBar } = machine;
  const current = `the ${formatWithUnit(powerSourceMaxCurrentA, "current", units)} your power source gives`;
  const feed = `your table's top feed of ${formatWithUnit(topFeedMmMin, "feed", units)}`;
  const fed = capAt({ setpoints, limits: [] }, "currentA", "power-source-current", powerSourceMaxCurrentA, current);
  const slowed = slowWithCurrent(fed, setpoints.currentA.value);
  const held = capAt(slowed, "feedMmMin", "top-feed", topFeedMmMin, feed);
  if (torchPressureBar === null) return held;
  const pressure = `the ${formatWithUnit(torchPressureBar, "pressure", units)} you have at the torch`;
  return capAt(held, "pressureBar", "torch-pressure", torchPressureBar, pressure);
}

function capAt(bent: Bent, metric: Metric, limit: LimitHit["limit"], most: number, what: string): Bent {
  const { value, low, high, steps, ...rest } = bent.setpoints[metric];
  if (value === null || Math.max(value, high ?? value) <= most) return bent;
  const isMoved = value > most;
  const text = isMoved ? `Brought down to ${what}.` : `The range ends at ${what}.`;
  const capped: StartingSetpoint = {
    ...rest,
    value: Math.min(value, most),
    low: low === null ? null : Math.min(low, most),
    high: high === null ? null : Math.min(high, most),
    steps: [...steps, { kind: "limit", text }],
  };
  const hit: LimitHit = { limit, metric, wanted: value, given: most, text: `${text} ${consequence[limit]}` };
  return {
    setpoints: { ...bent.setpoints, [metric]: capped },
    limits: isMoved ? [...bent.limits, hit] : bent.limits,
  };
}

/** Common practice, no source. */
const consequence: Record<LimitHit["limit"], string> = {
  "power-source-current": "Expect a slower cut with more dross; a smaller nozzle may suit better.",
  "top-feed": "Expect low-speed dross; less current or a smaller nozzle may suit better.",
  "torch-pressure": "Expect a softer arc and shorter nozzle life; see to the air supply first.",
};

function slowWithCurrent(bent: Bent, wantedCurrentA: number | null): Bent {
  const { value, low, high, steps, ...rest } = bent.setpoints.feedMmMin;
  const currentA = bent.setpoints.currentA.value;
  if (value === null || currentA === null || wantedCurrentA === null || currentA >= wantedCurrentA) return bent;
  const slower = (feed: number | null) =>
    feed === null ? null : roundForRelease("feedMmMin", (feed * currentA) / wantedCurrentA);
  const given = slower(value)!; // value is not null
  const text = `Slowed in proportion to the current, ${currentA} A instead of ${wantedCurrentA} A: common practice, no source.`;
  const feed: StartingSetpoint = {
    ...rest,
    value: given,
    low: slower(low),
    high: slower(high),
    steps: [...steps, { kind: "limit", text }],
  };
  const hit: LimitHit = { limit: "power-source-current", metric: "feedMmMin", wanted: value, given, text };
  return { setpoints: { ...bent.setpoints, feedMmMin: feed }, limits: [...bent.limits, hit] };
}
