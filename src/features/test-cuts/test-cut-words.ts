import { type drossAmounts, type TestCut, topEdgeLabels } from "#shared/contracts/test-cuts.ts";
import type { QualityRange } from "#shared/cut-quality/iso9013.ts";
import { formatNumber, formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

export const drossLabels: Record<(typeof drossAmounts)[number], string> = {
  none: "None",
  light: "Light",
  moderate: "Moderate",
  heavy: "Heavy",
};

/** A range of ISO 9013, such as "range 3"; u has five, Rz5 four. */
export function rangeWords(range: QualityRange | null): string {
  if (range === null) return "";
  return range === "outside" ? "outside all ranges" : `range ${range}`;
}

/** What was seen, in a few words: "No dross, top edge square". */
export function seenWords({ cutThrough, dross, topEdge }: TestCut): string {
  const through = cutThrough ? [] : ["Not cut through"];
  const drossWord = dross === "none" ? "no dross" : `${drossLabels[dross].toLowerCase()} dross`;
  const text = [...through, drossWord, `top edge ${topEdgeLabels[topEdge].toLowerCase()}`].join(", ");
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** What was measured, each with its unit: "bevel 2°, u 0.4 mm (range 3)". */
export function measuredWords(cut: TestCut, units: UnitSystem): string[] {
  const { bevelDeg, kerfWidthMm, uMm, rz5Um, uRange, rz5Range } = cut;
  const inRange = (range: QualityRange | null) => (range === null ? "" : ` (${rangeWords(range)})`);
  return [
    bevelDeg === null ? "" : `bevel ${formatNumber(bevelDeg, 1)}°`,
    kerfWidthMm === null ? "" : `kerf ${formatWithUnit(kerfWidthMm, "length", units)}`,
    uMm === null ? "" : `u ${formatWithUnit(uMm, "length", units)}${inRange(uRange)}`,
    rz5Um === null ? "" : `Rz5 ${formatNumber(rz5Um, 1)} µm${inRange(rz5Range)}`,
  ].filter(Boolean);
}
