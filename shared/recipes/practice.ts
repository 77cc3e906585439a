import type { ProcessGas } from "../materials/materials.ts";
import { barPerPsi, mmPerInch } from "../units/units.ts";
import type { Metric } from "./metrics.ts";

/** A rule of thumb's answer: every one of them is common practice, no source. */
export interface RuleOfThumb {
  value: number;
  low: number;
  high: number;
  /** The rule itself, in words. */
  rule: string;
}

export interface PracticeSubject {
  gas: ProcessGas;
  nozzleMm: number;
  /** Cut height the recipe will have, for the pierce height above it. */
  cutHeightMm: number;
}

/**
 * Common practice, no source, for compressed air: currents used with a nozzle of this orifice. With 0.6 mm everybody says
 * 30 A; the room to either side of it is ours.
 */
const currentByNozzle = [
  { nozzleMm: 0.6, low: 28, high: 32 },
  { nozzleMm: 0.8, low: 40, high: 45 },
  { nozzleMm: 1, low: 50, high: 55 },
] as const;

/** 65 to 70 psi at the torch, in bar gauge. */
const pressureBar = { low: 65 * barPerPsi, high: 70 * barPerPsi };

/** About 1/16 in, mm. The room to either side is ours: a quarter of it. */
export const firstCutHeightMm = 1.6;
const pierceOverCutHeight = { low: 2, high: 2.5 };

/**
 * Nozzle for a thickness, mm: 0.6 below 1/8 in, 0.8 up to 1/4 in, 1.0 above. Common practice, no source, for compressed
 * air. A sheet sold as 1/8 or 1/4 in is counted as that though it measures a few hundredths off.
 */
export function practiceNozzleMm(thicknessMm: number): 0.6 | 0.8 | 1 {
  const asSold = 0.05;
  if (thicknessMm < mmPerInch / 8 - asSold) return 0.6;
  return thicknessMm <= mmPerInch / 4 + asSold ? 0.8 : 1;
}

/**
 * What common practice sets, without regard to thickness: with the nozzle chosen, of all setpoints the feed alone follows
 * it. Null where practice has no number that travels from shop to shop: feed, pierce delay, arc voltage, kerf; and for
 * any gas but air.
 */
export function ruleOfThumb(metric: Metric, { gas, nozzleMm, cutHeightMm }: PracticeSubject): RuleOfThumb | null {
  if (gas !== "air") return null;
  switch (metric) {
    case "currentA":
      return currentFor(nozzleMm);
    case "pressureBar":
      return between(pressureBar, "65 to 70 psi (4.5 to 4.8 bar) at the torch while it flows, whatever the thickness");
    case "cutHeightMm":
      return {
        ...between(
          { low: 0.75 * firstCutHeightMm, high: 1.25 * firstCutHeightMm },
          "a first cut height of about 1/16 in (1.6 mm)",
        ),
        value: firstCutHeightMm,
      };
    case "pierceHeightMm":
      return between(
        { low: pierceOverCutHeight.low * cutHeightMm, high: pierceOverCutHeight.high * cutHeightMm },
        "a pierce height of 2 to 2.5 times the cut height",
      );
    case "feedMmMin":
    case "pierceDelayS":
    case "arcVoltageV":
    case "kerfWidthMm":
      return null;
  }
}

/** Least current in common use with a nozzle, A; 0 where practice does not know the nozzle. */
export function lowestCurrentA(nozzleMm: number): number {
  return currentFor(nozzleMm)?.low ?? 0;
}

/** Between the nozzles practice knows, current is drawn straight from one to the next; beyond them it says nothing. */
function currentFor(nozzleMm: number): RuleOfThumb | null {
  const known = currentByNozzle.find((entry) => Math.abs(entry.nozzleMm - nozzleMm) < 0.05);
  if (known) return between(known, `${range(known)} A with a ${known.nozzleMm} mm nozzle`);
  const above = currentByNozzle.findIndex((entry) => entry.nozzleMm > nozzleMm);
  const [from, to] = [currentByNozzle[above - 1], currentByNozzle[above]];
  if (!from || !to) return null;
  const share = (nozzleMm - from.nozzleMm) / (to.nozzleMm - from.nozzleMm);
  const along = (a: number, b: number) => a + share * (b - a);
  const limits = { low: along(from.low, to.low), high: along(from.high, to.high) };
  return between(
    limits,
    `between the ${range(from)} A of a ${from.nozzleMm} mm and the ${range(to)} A of a ${to.nozzleMm} mm nozzle`,
  );
}

function range({ low, high }: { low: number; high: number }): string {
  return high - low < 5 ? `${(low + high) / 2}` : `${low} to ${high}`;
}

function between({ low, high }: { low: number; high: number }, rule: string): RuleOfThumb {
  return { value: (low + high) / 2, low, high, rule };
}
