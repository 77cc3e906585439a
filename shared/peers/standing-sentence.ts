import { quantileShares } from "../disclosure/tails.ts";
import { type Metric, metricDefinitions } from "../recipes/metrics.ts";
import { formatWithUnit } from "../units/format.ts";
import type { UnitSystem } from "../units/units.ts";
import type { Standing } from "./standing.ts";

interface Words {
  more: string;
  less: string;
  /** What peers do who lie below and above. */
  peersBelow: string;
  peersAbove: string;
}

const words: Record<Metric, Words> = {
  currentA: { more: "higher", less: "lower", peersBelow: "use less current", peersAbove: "use more current" },
  pressureBar: { more: "higher", less: "lower", peersBelow: "set less pressure", peersAbove: "set more pressure" },
  feedMmMin: { more: "quicker", less: "slower", peersBelow: "cut slower", peersAbove: "cut quicker" },
  cutHeightMm: { more: "higher", less: "lower", peersBelow: "cut closer", peersAbove: "cut higher" },
  pierceHeightMm: { more: "higher", less: "lower", peersBelow: "pierce closer", peersAbove: "pierce higher" },
  pierceDelayS: { more: "longer", less: "shorter", peersBelow: "wait less", peersAbove: "wait longer" },
  arcVoltageV: { more: "higher", less: "lower", peersBelow: "hold less voltage", peersAbove: "hold more voltage" },
  kerfWidthMm: { more: "wider", less: "narrower", peersBelow: "cut a narrower kerf", peersAbove: "cut a wider kerf" },
};

/** A standing in one sentence, such as "Your 2,450 mm/min is quicker than most: about 82 % of peers cut slower." */
export function standingSentence(metric: Metric, value: number, standing: Standing, unitSystem: UnitSystem): string {
  const { more, less, peersBelow, peersAbove } = words[metric];
  const own = `Your ${formatWithUnit(value, metricDefinitions[metric].quantity, unitSystem)}`;
  const { percentile, position, edge } = standing;

  if (percentile === null && edge !== null) {
    const beyond = Math.round(100 * (position === "above" ? 1 - quantileShares[edge] : quantileShares[edge]));
    const [side, others] = position === "above" ? [`above ${edge}`, peersAbove] : [`below ${edge}`, peersBelow];
    const amount = beyond >= 25 ? "fewer than a quarter of peers" : `fewer than ${beyond} % of peers`;
    return `${own} is ${side}: ${amount} ${others}.`;
  }
  const percent = percentile ?? 50;
  if (percent > 60) return `${own} is ${more} than most: about ${percent} % of peers ${peersBelow}.`;
  if (percent < 40) return `${own} is ${less} than most: about ${100 - percent} % of peers ${peersAbove}.`;
  return `${own} is near the middle: about ${percent} % of peers ${peersBelow}.`;
}
