import type { Material } from "./materials.ts";
import { thermalProperties } from "./properties.ts";

const roomC = 20;

export interface HeatCheckInput {
  material: Material;
  thicknessMm: number;
  feedMmMin: number | null;
  kerfWidthMm: number | null;
  currentA: number | null;
  arcVoltageV: number | null;
}

export const heatVerdicts = ["impossible", "high", "plausible", "low"] as const;

export interface HeatCheck {
  /** Power that melting the kerf takes, W. */
  meltPowerW: number;
  /** Power of the arc, W. */
  arcPowerW: number;
  /** Melt power over arc power. Above 1 cannot be. */
  ratio: number;
  verdict: (typeof heatVerdicts)[number];
  words: string;
}

/** Between these shares of the arc's power ordinary cuts melt their kerf. Common practice, no source. */
export const plausibleRatio = { min: 0.08, max: 0.7 };

/**
 * Power needed to melt a kerf: how fast metal is removed times the heat each kilogram takes up to being liquid.
 *   P = feed × thickness × kerf × density × (mean specific heat × (melting - 20 °C) + heat of fusion)
 * Some of the metal leaves as soft dross rather than melt and some is overheated, so this is a check, not a prediction.
 * @param thicknessMm, kerfWidthMm  mm, > 0
 * @param feedMmMin  mm/min, > 0
 * @returns W
 * @throws RangeError when an input is not above zero
 */
export function meltPowerW(material: Material, thicknessMm: number, kerfWidthMm: number, feedMmMin: number): number {
  if (!(thicknessMm > 0 && kerfWidthMm > 0 && feedMmMin > 0)) {
    throw new RangeError("meltPowerW needs thickness, kerf and feed above zero");
  }
  const { densityKgM3, meanSolidSpecificHeatJKgK, meltingC, heatOfFusionJKg } = thermalProperties[material];
  const kgPerSecond = (feedMmMin / 60_000) * (thicknessMm / 1000) * (kerfWidthMm / 1000) * densityKgM3;
  return kgPerSecond * (meanSolidSpecificHeatJKgK * (meltingC - roomC) + heatOfFusionJKg);
}

function verdictOf(ratio: number): HeatCheck["verdict"] {
  if (ratio > 1) return "impossible";
  if (ratio > plausibleRatio.max) return "high";
  return ratio < plausibleRatio.min ? "low" : "plausible";
}

const words: Record<HeatCheck["verdict"], string> = {
  impossible:
    "The arc cannot melt this kerf at this feed. Look for a wrong unit: feed too high, current or thickness mistyped.",
  high: "Nearly all of the arc's power would have to melt metal. Check feed, kerf and current for a wrong unit.",
  plausible: "The arc has power to spare for this kerf, as an ordinary cut has.",
  low: "Hardly any of the arc's power would melt metal. Look for a feed typed in mm/s or in/min, or a wrong thickness.",
};

/** Holds a recipe's arc power against the power its kerf takes. Null while a figure is missing. */
export function heatCheck(input: HeatCheckInput): HeatCheck | null {
  const { material, thicknessMm, feedMmMin, kerfWidthMm, currentA, arcVoltageV } = input;
  const [feed, kerf, current, voltage] = [feedMmMin, kerfWidthMm, currentA, arcVoltageV];
  if (!(thicknessMm > 0) || !feed || !kerf || !current || !voltage) return null;
  if (feed < 0 || kerf < 0 || current < 0 || voltage < 0) return null;
  const melt = meltPowerW(material, thicknessMm, kerf, feed);
  const arc = current * voltage;
  const ratio = melt / arc;
  const verdict = verdictOf(ratio);
  return { meltPowerW: melt, arcPowerW: arc, ratio, verdict, words: words[verdict] };
}
