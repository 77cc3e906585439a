import { forEachMetric, type Metric, type Setpoints } from "../recipes/metrics.ts";

/** Steps per unit rather than the step: n/20 is exact to the last digit where n·0.05 is not. Feed has no fixed step. */
const stepsPerUnit: Record<Exclude<Metric, "feedMmMin">, number> = {
  currentA: 2,
  pressureBar: 20,
  cutHeightMm: 20,
  pierceHeightMm: 20,
  pierceDelayS: 20,
  arcVoltageV: 2,
  kerfWidthMm: 20,
};

const feedFigures = 3;

/** The rounding rule: every released value, in its stored unit, keeps no more than this. Monotone in the value. */
export function roundForRelease(metric: Metric, value: number): number {
  if (metric === "feedMmMin") return Number(value.toPrecision(feedFigures));
  return Math.round(value * stepsPerUnit[metric]) / stepsPerUnit[metric];
}

/** How far apart two released values of a metric are at the least near `value`, in its stored unit. */
export function roundingStep(metric: Metric, value: number): number {
  if (metric !== "feedMmMin") return 1 / stepsPerUnit[metric];
  return 10 ** (Math.floor(Math.log10(value)) + 1 - feedFigures);
}

export function roundSetpoints(setpoints: Setpoints): Setpoints {
  return forEachMetric((metric) => {
    const value = setpoints[metric];
    return value === null ? null : roundForRelease(metric, value);
  });
}

/** To 0.1 mm: enough to cut by, too coarse to tell one shop's sheet from another's. */
export function roundThickness(thicknessMm: number): number {
  return Math.round(thicknessMm * 10) / 10;
}
