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

export interface Question {
  field: LimitedField;
  detail: string;
}

function outside(value: number | null, { min, max }: Range): value is number {
  return value !== null && (value < min || value > max);
}

/** What to ask before a recipe is kept: values that can be, but seldom are. */
export function softQuestions(
  figures: Partial<Setpoints> & { thicknessMm?: number; nozzleMm?: number },
  units: UnitSystem,
): Question[] {
  const fields: LimitedField[] = ["thicknessMm", "nozzleMm", ...metrics];
  return fields.flatMap((field) => {
    const { label, quantity, soft } = fieldLimits[field];
    const value = figures[field] ?? null;
    if (!outside(value, soft)) return [];
    const shown = formatWithUnit(value, quantity, units);
    return [
      {
        field,
        detail: `${label} of ${shown} is seldom right. Usual: ${limitText(soft, quantity, units)}. Check the unit.`,
      },
    ];
  });
}
