import type { Material } from "../materials/materials.ts";
import { forEachMetric, type Metric, metricDefinitions, metrics, type Setpoints } from "../recipes/metrics.ts";
import { barPerPsi, mmPerInch } from "../units/units.ts";
import { idealSetpoints, usualNozzleMm, usualVariation, type Variation } from "./cut-model.ts";
import type { Random } from "./random.ts";

/** How a shop writes its numbers: inch shops round to whole psi and 5 in/min, metric ones to 0.1 bar and 50 mm/min. */
export type WritingHabit = "metric" | "inch";

export interface SimulatedMachine {
  maxCurrentA: number;
  topFeedMmMin: number;
  /** This machine's own way, added to the model: logs for feed and kerf. */
  habit: Record<Metric, number>;
}

export interface SimulatedRecipe {
  material: Material;
  thicknessMm: number;
  nozzleMm: number;
  setpoints: Setpoints;
  /** Mistyped on purpose: a value that can be, but is not what the shop cuts with. */
  wild: boolean;
}

export function simulateMachine(random: Random, variation: Variation = usualVariation): SimulatedMachine {
  const habit = forEachMetric((metric) => random.normal() * variation.between[metric]);
  return {
    maxCurrentA: random.pick([45, 60, 65, 65, 85, 105]),
    topFeedMmMin: random.pick([6000, 8000, 10_000, 12_000, 15_000]),
    habit,
  };
}

/** Stock sizes by writing habit, mm: what a yard sells. */
const stock: Record<WritingHabit, readonly number[]> = {
  metric: [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12],
  inch: [1 / 16, 5 / 64, 1 / 8, 3 / 16, 1 / 4, 5 / 16, 3 / 8, 1 / 2].map((inches) => inches * mmPerInch),
};

const metals: readonly Material[] = [
  "mild-steel",
  "mild-steel",
  "mild-steel",
  "stainless-steel",
  "aluminium",
  "galvanised-steel",
];

/** One recipe for a metal the shop cuts; thin and middling sheet more often than plate. */
export function simulateRecipe(random: Random, machine: SimulatedMachine, habit: WritingHabit): SimulatedRecipe {
  const material = random.pick(metals);
  const sizes = stock[habit];
  const usable = sizes.filter((mm) => material !== "galvanised-steel" || mm <= 5);
  // The smaller of two draws: thin sheet is more common than plate.
  const thicknessMm =
    usable[Math.min(random.whole(0, usable.length - 1), random.whole(0, usable.length - 1) + 2, usable.length - 1)]!;
  const nozzleMm = chooseNozzle(random, thicknessMm, machine.maxCurrentA);
  const wild = random.chance(0.006);
  return {
    material,
    thicknessMm,
    nozzleMm,
    setpoints: simulateSetpoints(random, machine, habit, { material, thicknessMm, nozzleMm, wild }),
    wild,
  };
}

function chooseNozzle(random: Random, thicknessMm: number, maxCurrentA: number): number {
  const usual = usualNozzleMm(thicknessMm);
  const wanted = random.chance(0.15) ? random.pick([0.6, 0.8, 1]) : usual;
  return wanted * 52 <= maxCurrentA * 1.05 ? wanted : 0.8;
}

interface Subject {
  material: Material;
  thicknessMm: number;
  nozzleMm: number;
  wild: boolean;
}

function simulateSetpoints(
  random: Random,
  machine: SimulatedMachine,
  habit: WritingHabit,
  subject: Subject,
): Setpoints {
  const ideal = idealSetpoints(subject.material, subject.thicknessMm, subject.nozzleMm);
  const values = {} as Setpoints;
  for (const metric of metrics) {
    const shift = machine.habit[metric] + random.normal() * usualVariation.within[metric];
    const value = metricDefinitions[metric].logScale ? ideal[metric] * Math.exp(shift) : ideal[metric] + shift;
    values[metric] = random.chance(gaps[metric]) ? null : asTyped(value, metric, habit);
  }
  if (subject.wild) values.feedMmMin = clamp(ideal.feedMmMin / random.pick([4, 5]), "feedMmMin");
  if (values.feedMmMin !== null) values.feedMmMin = Math.min(values.feedMmMin, machine.topFeedMmMin);
  if (values.cutHeightMm !== null && values.pierceHeightMm !== null) {
    values.pierceHeightMm = Math.max(values.pierceHeightMm, values.cutHeightMm);
  }
  return values;
}

/** Share of recipes that leave a setpoint empty: kerf is seldom measured. Invented. */
const gaps: Record<Metric, number> = {
  currentA: 0,
  pressureBar: 0.04,
  feedMmMin: 0,
  cutHeightMm: 0.05,
  pierceHeightMm: 0.1,
  pierceDelayS: 0.08,
  arcVoltageV: 0.12,
  kerfWidthMm: 0.35,
};

function to(value: number, step: number): number {
  return Number((Math.round(value / step) * step).toFixed(6));
}

/** Rounded as a person writes it down. */
function asTyped(value: number, metric: Metric, habit: WritingHabit): number {
  const inch = habit === "inch";
  const written: Record<Metric, () => number> = {
    currentA: () => to(value, 1),
    pressureBar: () => (inch ? to(value / barPerPsi, 1) * barPerPsi : to(value, 0.1)),
    feedMmMin: () =>
      inch ? to(value / mmPerInch, value > 2500 ? 5 : 1) * mmPerInch : to(value, value > 2000 ? 50 : 10),
    cutHeightMm: () => (inch ? to(value / mmPerInch, 0.005) * mmPerInch : to(value, 0.1)),
    pierceHeightMm: () => (inch ? to(value / mmPerInch, 0.01) * mmPerInch : to(value, 0.1)),
    pierceDelayS: () => to(Math.max(value, 0), 0.1),
    arcVoltageV: () => to(value, 1),
    kerfWidthMm: () => (inch ? to(value / mmPerInch, 0.001) * mmPerInch : to(value, 0.05)),
  };
  return clamp(written[metric](), metric);
}

function clamp(value: number, metric: Metric): number {
  const { min, max } = metricDefinitions[metric].hard;
  return Number(Math.min(Math.max(value, min), max).toFixed(6));
}
