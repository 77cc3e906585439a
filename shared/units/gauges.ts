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
const lastGauge = firstGauge + weightLbFt2.length - 1;

/** The gauges kept here for a material. Galvanised sheet is rolled from gauge 8 on. */
export function gaugeRange(material: Material): { min: number; max: number } {
  return { min: material === "galvanised-steel" ? 8 : firstGauge, max: lastGauge };
}

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
 * Nominal sheet thickness of a gauge number in the material's own gauge system: mild steel by its weight (manufacturers'
 * standard), galvanised the same with its zinc, stainless by the old US standard, the rest Brown & Sharpe.
 * @returns mm, to the micrometre, which is finer than the printed tables; null where the system has no such gauge here
 */
export function gaugeThicknessMm(material: Material, gauge: number): number | null {
  const { min, max } = gaugeRange(material);
  if (!Number.isInteger(gauge) || gauge < min || gauge > max) return null;
  return Math.round(inches(material, gauge) * mmPerInch * 1000) / 1000;
}

/** The gauge whose thickness lies within a tolerance of this one, or null. */
export function nearestGauge(material: Material, thicknessMm: number, toleranceMm = 0.02): number | null {
  const { min, max } = gaugeRange(material);
  let best: { gauge: number; off: number } | null = null;
  for (let gauge = min; gauge <= max; gauge++) {
    const off = Math.abs(gaugeThicknessMm(material, gauge)! - thicknessMm); // within its range
    if (off <= toleranceMm && (best === null || off < best.off)) best = { gauge, off };
  }
  return best?.gauge ?? null;
}
