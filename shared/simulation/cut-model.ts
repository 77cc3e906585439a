import { meltPowerW } from "../materials/heat-check.ts";
import type { Material } from "../materials/materials.ts";
import type { Metric } from "../recipes/metrics.ts";

/**
 * A plain physical model of a good cut, for invented data: no figure comes from anybody's chart.
 *
 * - Current: the orifice carries about 52 A a millimetre, which gives the trade's 30 A at 0.6 mm, 40-45 A at 0.8 mm and
 *   50-55 A at 1.0 mm (common practice, no source).
 * - Pressure: 4.6 bar whatever the thickness, inside the trade's 65-70 psi (common practice, no source).
 * - Kerf: the orifice and half as much again, wider with thickness.
 * - Arc voltage: a fall at the electrodes, a column that grows with the standoff (5 V/mm) and with the depth of the cut.
 * - Feed: the energy balance. A share of the arc's power that falls slowly with thickness melts the kerf.
 * - Heights: cut at about 1/16 in, pierced at 2.5 times that (common practice, no source).
 * - Pierce delay: a little more than in proportion to thickness.
 * Coefficients beyond those are invented.
 */
export function idealSetpoints(material: Material, thicknessMm: number, nozzleMm: number): Record<Metric, number> {
  const currentA = 52 * nozzleMm;
  const cutHeightMm = 1.5;
  const kerfWidthMm = 0.1 + 1.5 * nozzleMm + 0.02 * thicknessMm;
  const arcVoltageV = 76 + materialVolts[material] + 9 * Math.log(1 + thicknessMm) + 5 * cutHeightMm;
  const meltingShare = meltingShares[material] * (thicknessMm / 3) ** -0.1;
  const wattsAtOneMmMin = meltPowerW(material, thicknessMm, kerfWidthMm, 1);
  return {
    currentA,
    pressureBar: 4.6,
    feedMmMin: Math.min((meltingShare * currentA * arcVoltageV) / wattsAtOneMmMin, 9000),
    cutHeightMm,
    pierceHeightMm: 2.5 * cutHeightMm,
    pierceDelayS: 0.08 * thicknessMm ** 1.15,
    arcVoltageV,
    kerfWidthMm,
  };
}

/** Share of the arc's power that melts a kerf in 3 mm; good conductors carry more of it away. Invented. */
const meltingShares: Record<Material, number> = {
  "mild-steel": 0.4,
  "galvanised-steel": 0.4,
  "stainless-steel": 0.37,
  aluminium: 0.22,
  copper: 0.18,
  brass: 0.24,
};

/** What a metal adds to the arc's voltage over mild steel, V. Invented. */
const materialVolts: Record<Material, number> = {
  "mild-steel": 0,
  "galvanised-steel": 1,
  "stainless-steel": 4,
  aluminium: 9,
  copper: 6,
  brass: 5,
};

/** Nozzle by thickness as the trade chooses it: 0.6 mm below 1/8 in, 0.8 mm up to 1/4 in, 1.0 mm above. Common practice, no source. */
export function usualNozzleMm(thicknessMm: number): number {
  if (thicknessMm < 3.0) return 0.6;
  return thicknessMm <= 6.4 ? 0.8 : 1;
}

/** How much shops and machines differ, as standard deviations; natural logs for feed and kerf, stored units elsewhere. */
export interface Variation {
  /** Of a machine's habit around the model. */
  between: Record<Metric, number>;
  /** Of one recipe around its machine's habit. */
  within: Record<Metric, number>;
}

export const usualVariation: Variation = {
  between: {
    currentA: 1.5,
    pressureBar: 0.15,
    feedMmMin: 0.1,
    cutHeightMm: 0.12,
    pierceHeightMm: 0.3,
    pierceDelayS: 0.06,
    arcVoltageV: 4,
    kerfWidthMm: 0.04,
  },
  within: {
    currentA: 1,
    pressureBar: 0.1,
    feedMmMin: 0.06,
    cutHeightMm: 0.1,
    pierceHeightMm: 0.25,
    pierceDelayS: 0.05,
    arcVoltageV: 1.5,
    kerfWidthMm: 0.04,
  },
};
