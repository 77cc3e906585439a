import { formatWithUnit, limitText } from "../units/format.ts";
import type { TypedQuantity, UnitSystem } from "../units/units.ts";
import {
  type Metric,
  metricDefinitions,
  metrics,
  nozzleRangeMm,
  type Range,
  type Setpoints,
  thicknessRangeMm,
} from "./metrics.ts";
import { likelyMeant } from "./unit-slips.ts";

export type LimitedField = Metric | "thicknessMm" | "nozzleMm";

export interface FieldLimits {
  label: string;
  quantity: TypedQuantity;
  /** Outside: refused. */
  hard: Range;
  /** Outside: asked about, then accepted. */
  soft: Range;
}

/** Every figure of a recipe with what may be typed. In stored units. Soft limits are common practice, no source. */
export const fieldLimits: Record<LimitedField, FieldLimits> = {
  ...metricDefinitions,
  thicknessMm: { label: "Thickness", quantity: "thickness", hard: thicknessRangeMm, soft: { min: 0.5, max: 32 } },
  nozzleMm: { label: "Nozzle", quantity: "nozzle", hard: nozzleRangeMm, soft: { min: 0.5, max: 2 } },
};

export type RecipeFigures = Partial<Setpoints> & { thicknessMm?: number | null; nozzleMm?: number | null };

export interface FieldRemark {
  field: LimitedField;
  detail: string;
}

/** What is said of one figure: nothing, a question that a person may wave through, or a refusal. */
export type LimitCheck = { kind: "fine" } | { kind: "ask" | "refuse"; detail: string };

function outside(value: number, { min, max }: Range): boolean {
  return !(value >= min && value <= max); // NaN lies outside as well
}

/**
 * Holds one figure against what is possible and what is usual.
 * @param value  stored unit
 * @param units  the member's, in which the answer is worded
 */
export function checkSetpoint(field: LimitedField, value: number, units: UnitSystem): LimitCheck {
  const { label, quantity, hard, soft } = fieldLimits[field];
  const meant = likelyMeant(value, quantity, soft, units).join(" or ");
  if (outside(value, hard)) {
    const hint = meant && ` If you meant ${meant}, type the unit too.`;
    return { kind: "refuse", detail: `Allowed: ${limitText(hard, quantity, units)}.${hint}` };
  }
  if (!outside(value, soft)) return { kind: "fine" };
  const shown = formatWithUnit(value, quantity, units);
  const hint = meant ? `Did you mean ${meant}?` : "Check it.";
  return {
    kind: "ask",
    detail: `${label} of ${shown} is seldom right. Usual: ${limitText(soft, quantity, units)}. ${hint}`,
  };
}

/** A pierce below the cut height would drive the torch into the sheet. */
function pierceBelowCut({ pierceHeightMm, cutHeightMm }: RecipeFigures, units: UnitSystem): FieldRemark[] {
  if (pierceHeightMm == null || cutHeightMm == null || pierceHeightMm >= cutHeightMm) return [];
  const cut = formatWithUnit(cutHeightMm, "length", units);
  return [{ field: "pierceHeightMm", detail: `Pierce height cannot be below cut height, ${cut}` }];
}

/** What a recipe's figures are refused for, and what to ask before they are kept. Missing figures pass. */
export function checkLimits(
  figures: RecipeFigures,
  units: UnitSystem,
): { errors: FieldRemark[]; questions: FieldRemark[] } {
  const fields: LimitedField[] = ["thicknessMm", "nozzleMm", ...metrics];
  const remarks = fields.flatMap((field) => {
    const value = figures[field];
    if (value == null) return [];
    const check = checkSetpoint(field, value, units);
    return check.kind === "fine" ? [] : [{ field, ...check }];
  });
  const of = (kind: "ask" | "refuse"): FieldRemark[] =>
    remarks.filter((remark) => remark.kind === kind).map(({ field, detail }) => ({ field, detail }));
  return { errors: [...of("refuse"), ...pierceBelowCut(figures, units)], questions: of("ask") };
}
