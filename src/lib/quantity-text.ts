import { z } from "zod";
import type { Material } from "#shared/materials/materials.ts";
import type { Range } from "#shared/recipes/metrics.ts";
import { likelyMeant } from "#shared/recipes/unit-slips.ts";
import { formatQuantity, limitText, type TypedQuantity } from "#shared/units/format.ts";
import { parseQuantity } from "#shared/units/parse.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import type { QuantityReading } from "../ui/quantity-field.tsx";

export interface QuantityRule {
  quantity: TypedQuantity;
  units: UnitSystem;
  /** Allowed, in the stored unit. */
  range: Range;
  /** Which gauge system "11 ga" is read by. */
  material?: Material;
}

type Read = { ok: true; value: number } | { ok: false; problem: string };

/** What somebody typed, in the stored unit, or what is wrong with it in their own unit. */
export function readQuantity(text: string, { quantity, units, range, material }: QuantityRule): Read {
  const parsed = parseQuantity(text, quantity, units, material ? { material } : {});
  if (!parsed.ok) return parsed;
  const within = parsed.value >= range.min && parsed.value <= range.max;
  if (within) return parsed;
  const meant = likelyMeant(parsed.value, quantity, range, units).join(" or ");
  const hint = meant && ` If you meant ${meant}, type the unit too.`;
  return { ok: false, problem: `Allowed: ${limitText(range, quantity, units)}.${hint}` };
}

/** The same as a live reading below a field. */
export function reading(rule: QuantityRule): (text: string) => QuantityReading {
  return (text) => {
    const read = readQuantity(text, rule);
    if (!read.ok) return read;
    const shown = formatQuantity(read.value, rule.quantity, rule.units);
    return { ok: true, text: `${shown.text} ${shown.unit}` };
  };
}

/** A form field that holds what was typed and yields the stored value. */
export function quantityText(rule: QuantityRule) {
  return z.string().transform((text, context) => take(text, rule, context));
}

/** The same where nothing typed means nothing known. */
export function optionalQuantityText(rule: QuantityRule) {
  return z.string().transform((text, context) => (text.trim() === "" ? null : take(text, rule, context)));
}

function take(text: string, rule: QuantityRule, context: z.RefinementCtx): number {
  const read = text.trim() === "" ? ({ ok: false, problem: "Fill this in" } as const) : readQuantity(text, rule);
  if (read.ok) return read.value;
  context.addIssue({ code: "custom", message: read.problem });
  return z.NEVER;
}
