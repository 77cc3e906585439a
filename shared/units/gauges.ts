import type { Material } from "../materials/materials.ts";
import { mmPerInch } from "./units.ts";

/**
 * Weight of iron and steel sheet by gauge, lb/ft², gauges 3 to 26.
 * Source: 15 U.S.C. 206 (Act of 3 March 1893). Gauges 3 to 22 were seen there; 23 to 26 are from memory.
 */
const weightLbFt2 = [
  10, 9.375, 8.75, 8.125, 7.5, 6.875, 6.25, 5.625, 5, 4.375, 3.75, 3.125, 2.8125, 2.5, 2.25, 2, 1.75, 1.5, 1.375, 1.25,
  1.125, 1, 0.875, 0.75,
];
const firstGauge = 3;
export const gaugeRange = { min: firstGauge, max: firstGauge + weightLbFt2.length - 1 };

/** lb/ft² in an inch of thickness: 41.82 for uncoated steel (ASTM B258, appendix), 40 in the old US standard. */
const sheetSteel = 41.82;
const usStandard = 40;
/** Zinc on both faces, 2.5 oz/ft², lb/ft². */
const zinc = 2.5 / 16;

function inches(material: Material, gauge: number): number {
  const weight = weightLbFt2[gauge - firstGauge]!; // the caller has checked the range
  switch (material) {
    case "mild-steel":
      return weight / sheetSteel;
    case "galvanised-steel":
      return (weight + zinc) / sheetSteel;
    case "stainless-steel":
      return weight / usStandard;
    default:
      // Brown & Sharpe, ASTM B258.
      return 0.005 * 92 ** ((36 - gauge) / 39);
  }
}

/**
 * Sheet thickness of a gauge number in the material's own gauge system, mm.
 * @returns null where the system, as kept here, has no such gauge (3 to 26)
 */
export function gaugeThicknessMm(material: Material, gauge: number): number | null {
  if (!Number.isInteger(gauge) || gauge < gaugeRange.min || gauge > gaugeRange.max) return null;
  return inches(material, gauge) * mmPerInch;
}

/** The gauge whose thickness lies within a tolerance of this one, or null. */
export function nearestGauge(material: Material, thicknessMm: number, toleranceMm = 0.02): number | null {
  let best: { gauge: number; off: number } | null = null;
  for (let gauge = gaugeRange.min; gauge <= gaugeRange.max; gauge++) {
    const off = Math.abs(inches(material, gauge) * mmPerInch - thicknessMm);
    if (off <= toleranceMm && (best === null || off < best.off)) best = { gauge, off };
  }
  return best?.gauge ?? null;
}
