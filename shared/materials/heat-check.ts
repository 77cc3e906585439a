import { formatNumber, formatPercent } from "../units/format.ts";
import { likelySlips } from "./heat-slips.ts";
import type { Material, ProcessGas } from "./materials.ts";
import { thermalProperties } from "./properties.ts";

const ambientC = 20;

export interface HeatCheckInput {
  material: Material;
  thicknessMm: number | null;
  feedMmMin: number | null;
  kerfWidthMm: number | null;
  currentA: number | null;
  arcVoltageV: number | null;
  /** Oxygen burns part of the iron and so brings heat of its own; left out, no such heat is allowed for. */
  gas?: ProcessGas;
}

export const heatVerdicts = ["impossible", "high", "plausible", "low"] as const;
export type HeatVerdict = (typeof heatVerdicts)[number];

export interface HeatCheck {
  /** Power that melting the kerf takes, W. */
  meltPowerW: number;
  /** Power of the arc, W. */
  arcPowerW: number;
  /** Melt power over arc power. Above 1 cannot be, unless something burns. */
  ratio: number;
  verdict: HeatVerdict;
  words: string;
}

/**
 * Between these shares of the arc's power an ordinary cut melts its kerf: a brisk one in thin steel comes to 0.7, a slow
 * one in aluminium to 0.08. Common practice, no source. Wide enough for odd cuts, and narrow enough that a slip between
 * inches and millimetres, a factor of 25.4, cannot lead from inside to inside: 0.8 / 25.4 < 0.05 and 0.05 × 25.4 > 1.
 */
export const plausibleRatio = { min: 0.05, max: 0.8 };

/** Burning iron can give as much heat again as the arc. An estimate, no source. */
const withBurningIron = 2;

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
  const { densityKgM3 } = thermalProperties[material];
  const kgPerSecond = (feedMmMin / 60_000) * (thicknessMm / 1000) * (kerfWidthMm / 1000) * densityKgM3;
  return kgPerSecond * meltHeatJKg(material);
}

/** Heat that brings a kilogram from 20 °C to liquid, J/kg. */
export function meltHeatJKg(material: Material): number {
  const { meanSolidSpecificHeatJKgK, meltingC, heatOfFusionJKg } = thermalProperties[material];
  return meanSolidSpecificHeatJKgK * (meltingC - ambientC) + heatOfFusionJKg;
}

/** Holds a recipe's arc power against the power its kerf takes. Null while a figure is missing or not above zero. */
export function heatCheck(input: HeatCheckInput): HeatCheck | null {
  const { material, thicknessMm, feedMmMin, kerfWidthMm, currentA, arcVoltageV } = input;
  if (!isGiven(thicknessMm) || !isGiven(feedMmMin) || !isGiven(kerfWidthMm)) return null;
  if (!isGiven(currentA) || !isGiven(arcVoltageV)) return null;
  const melt = meltPowerW(material, thicknessMm, kerfWidthMm, feedMmMin);
  const arc = currentA * arcVoltageV;
  const ratio = melt / arc;
  const most = burnsIron(input) ? withBurningIron : 1;
  const verdict = verdictOf(ratio, most);
  const slips = verdict === "plausible" ? [] : likelySlips({ thicknessMm, feedMmMin, ratio }, plausibleRatio);
  const powers = `Melting this kerf takes ${kilowatts(melt)}, the arc gives ${kilowatts(arc)}`;
  return { meltPowerW: melt, arcPowerW: arc, ratio, verdict, words: `${powers}: ${ending(verdict, ratio, slips)}` };
}

function isGiven(value: number | null): value is number {
  return value !== null && Number.isFinite(value) && value > 0;
}

function burnsIron({ gas, material }: HeatCheckInput): boolean {
  return gas === "oxygen" && (material === "mild-steel" || material === "galvanised-steel");
}

function verdictOf(ratio: number, most: number): HeatVerdict {
  if (ratio > most) return "impossible";
  if (ratio > plausibleRatio.max * most) return "high";
  return ratio < plausibleRatio.min ? "low" : "plausible";
}

const kilowatts = (watts: number) => `${formatNumber(watts / 1000, watts < 1000 ? 2 : 1)} kW`;

function ending(verdict: HeatVerdict, ratio: number, slips: readonly string[]): string {
  const share = ratio < 0.1 ? `${formatNumber(ratio * 100, 1)} %` : formatPercent(ratio);
  const check = slips.length > 0 ? slips.join(" ") : "Check feed, thickness, kerf width, current and arc voltage.";
  switch (verdict) {
    case "impossible":
      return `that cannot be. ${check}`;
    case "high":
      return `${share}, which leaves little for losses. ${check}`;
    case "low":
      return `only ${share} of it. ${check}`;
    case "plausible":
      return `${share} of it, as in an ordinary cut.`;
  }
}
