/**
 * The eight setpoints that are also statistics, in the order a recipe lists them. The key carries the stored unit.
 * Thickness and nozzle are not here: they say which peer group a recipe belongs to.
 */
export const metrics = [
  "currentA",
  "pressureBar",
  "feedMmMin",
  "cutHeightMm",
  "pierceHeightMm",
  "pierceDelayS",
  "arcVoltageV",
  "kerfWidthMm",
] as const;
export type Metric = (typeof metrics)[number];

/** One value for each metric, made in the metrics' order. */
export function forEachMetric<Value>(make: (metric: Metric) => Value): Record<Metric, Value> {
  const made = metrics.map((metric) => [metric, make(metric)] as const);
  return Object.fromEntries(made) as Record<Metric, Value>; // fromEntries forgets the key type
}

/** A full or partial set of setpoints, each in the unit its key names. A missing one is null. */
export type Setpoints = Record<Metric, number | null>;

/** What kind of quantity a figure is: decides its units, its rounding on screen and what a person may type. */
export type Quantity = "current" | "pressure" | "feed" | "length" | "delay" | "voltage";

export interface Range {
  min: number;
  max: number;
}

export interface MetricDefinition {
  label: string;
  quantity: Quantity;
  /** Outside: refused. In the stored unit. */
  hard: Range;
  /** Outside: asked about, then accepted. In the stored unit. Common practice, no source. */
  soft: Range;
  /** Feed and kerf vary by factors rather than by steps, so they are summarised on a log scale. */
  logScale: boolean;
}

export const metricDefinitions: Record<Metric, MetricDefinition> = {
  currentA: {
    label: "Current",
    quantity: "current",
    hard: { min: 10, max: 400 },
    soft: { min: 15, max: 200 },
    logScale: false,
  },
  pressureBar: {
    label: "Gas pressure",
    quantity: "pressure",
    hard: { min: 2, max: 9 },
    soft: { min: 3.5, max: 7 },
    logScale: false,
  },
  feedMmMin: {
    label: "Feed rate",
    quantity: "feed",
    hard: { min: 50, max: 15_000 },
    soft: { min: 150, max: 12_000 },
    logScale: true,
  },
  cutHeightMm: {
    label: "Cut height",
    quantity: "length",
    hard: { min: 0.3, max: 10 },
    soft: { min: 0.8, max: 5 },
    logScale: false,
  },
  pierceHeightMm: {
    label: "Pierce height",
    quantity: "length",
    hard: { min: 0.5, max: 20 },
    soft: { min: 1.5, max: 10 },
    logScale: false,
  },
  pierceDelayS: {
    label: "Pierce delay",
    quantity: "delay",
    hard: { min: 0, max: 10 },
    soft: { min: 0, max: 4 },
    logScale: false,
  },
  arcVoltageV: {
    label: "Arc voltage",
    quantity: "voltage",
    hard: { min: 50, max: 220 },
    soft: { min: 70, max: 180 },
    logScale: false,
  },
  kerfWidthMm: {
    label: "Kerf width",
    quantity: "length",
    hard: { min: 0.3, max: 6 },
    soft: { min: 0.8, max: 4 },
    logScale: true,
  },
};

export const thicknessRangeMm: Range = { min: 0.4, max: 50 };
export const nozzleRangeMm: Range = { min: 0.4, max: 3 };
