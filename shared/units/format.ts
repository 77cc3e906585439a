import type { Material } from "../materials/materials.ts";
import type { Range } from "../recipes/metrics.ts";
import { nearestGauge } from "./gauges.ts";
import { memberUnits, mmPerInch, type TypedQuantity, type UnitSystem } from "./units.ts";

export type { TypedQuantity } from "./units.ts";

interface Places {
  /** Digits behind the point that are always shown, so that a column of figures lines up. */
  min: number;
  max: number;
}

const fixed = (places: number): Places => ({ min: places, max: places });
const upTo = (places: number): Places => ({ min: 0, max: places });

const places: Record<TypedQuantity, Record<UnitSystem, Places>> = {
  current: { metric: upTo(1), inch: upTo(1) },
  voltage: { metric: fixed(1), inch: fixed(1) },
  delay: { metric: fixed(2), inch: fixed(2) },
  pressure: { metric: fixed(2), inch: upTo(1) },
  feed: { metric: upTo(0), inch: upTo(1) },
  length: { metric: fixed(2), inch: fixed(3) },
  thickness: { metric: upTo(2), inch: fixed(3) },
  nozzle: { metric: { min: 1, max: 2 }, inch: { min: 1, max: 2 } },
};

export interface Shown {
  text: string;
  unit: string;
}

const formats = new Map<string, Intl.NumberFormat>();

/** Formatters are slow to make and a table needs thousands of figures. */
function formatOf({ min, max }: Places): Intl.NumberFormat {
  const key = `${min}-${max}`;
  const known = formats.get(key);
  if (known) return known;
  const made = new Intl.NumberFormat("en", {
    minimumFractionDigits: min,
    maximumFractionDigits: max,
    signDisplay: "negative", // never "-0"
  });
  formats.set(key, made);
  return made;
}

/** A number in English digits, "2,450.5", with at most so many places. The one number formatter. */
export function formatNumber(value: number, maxPlaces = 0, minPlaces = 0): string {
  return formatOf({ min: minPlaces, max: maxPlaces }).format(value);
}

/** A whole count: "1,512". */
export function formatCount(value: number): string {
  return formatNumber(value, 0);
}

/** A share in whole per cent: 0.82 -> "82 %". */
export function formatPercent(share: number): string {
  return `${formatNumber(share * 100, 0)} %`;
}

export function unitLabel(quantity: TypedQuantity, units: UnitSystem): string {
  return memberUnits[quantity][units].label;
}

/** A stored value in the member's unit, unrounded: for axes and scales. */
export function toDisplayNumber(value: number, quantity: TypedQuantity, units: UnitSystem): number {
  return value / memberUnits[quantity][units].factor;
}

/** A stored value as the member reads it. */
export function formatQuantity(value: number, quantity: TypedQuantity, units: UnitSystem): Shown {
  const { min, max } = places[quantity][units];
  return {
    text: formatNumber(toDisplayNumber(value, quantity, units), max, min),
    unit: unitLabel(quantity, units),
  };
}

/** The same as one piece of text: "2,450 mm/min". */
export function formatWithUnit(value: number, quantity: TypedQuantity, units: UnitSystem): string {
  const { text, unit } = formatQuantity(value, quantity, units);
  return `${text} ${unit}`;
}

/** An allowed range: "10 to 400 A". Rounded inwards, so that what it names is allowed. */
export function limitText(range: Range, quantity: TypedQuantity, units: UnitSystem): string {
  const digits = places[quantity][units].max;
  const step = 10 ** digits;
  // A hair of slack, or 25.4/25.4 would round up past itself.
  const from = Math.ceil(toDisplayNumber(range.min, quantity, units) * step - 1e-9) / step;
  const to = Math.floor(toDisplayNumber(range.max, quantity, units) * step + 1e-9) / step;
  return `${formatNumber(from, digits)} to ${formatNumber(to, digits)} ${unitLabel(quantity, units)}`;
}

/** Digits behind the point a person would type at most: a 64th of an inch takes six, a 16th four in mm. */
const typedPlaces: Record<UnitSystem, number> = { metric: 4, inch: 6 };

/**
 * What a field holds to begin with: parsed again it gives the stored value, to eleven figures at least.
 * A value that comes out even in the member's unit is a bare number. One that comes out even only in the other system's
 * unit was typed in that: it stays so, with its unit ("3.2 mm" in an inch field), rather than grow into 0.1259842520.
 */
export function editText(value: number, quantity: TypedQuantity, units: UnitSystem): string {
  const other: UnitSystem = units === "metric" ? "inch" : "metric";
  const own = evenText(value, quantity, units);
  if (own !== null) return own;
  const theirs = evenText(value, quantity, other);
  if (theirs !== null) return `${theirs} ${unitLabel(quantity, other)}`;
  return withoutExponent(toDisplayNumber(value, quantity, units));
}

function evenText(value: number, quantity: TypedQuantity, units: UnitSystem): string | null {
  const shown = toDisplayNumber(value, quantity, units);
  const even = Number(shown.toFixed(typedPlaces[units]));
  return Math.abs(even - shown) <= 1e-11 * Math.abs(shown) ? String(even) : null;
}

/** Twelve figures, as digits alone: no person types 1.2e-7. */
function withoutExponent(value: number): string {
  const whole = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
  return value
    .toFixed(Math.min(100, Math.max(0, 11 - whole)))
    .replace(/(\.\d*?)0+$/, "$1")
    .replace(/\.$/, "");
}

/** As 1/8 or 3/16, where the thickness is a 64th of an inch or coarser; null elsewhere. */
export function inchFraction(mm: number, toleranceMm = 0.02): string | null {
  const parts = Math.round((mm / mmPerInch) * 64);
  if (parts === 0 || Math.abs((parts / 64) * mmPerInch - mm) > toleranceMm) return null;
  let [above, below] = [parts, 64];
  while (above % 2 === 0 && below > 1) [above, below] = [above / 2, below / 2];
  const whole = Math.floor(above / below);
  const rest = above - whole * below;
  if (rest === 0) return String(whole);
  return whole > 0 ? `${whole} ${rest}/${below}` : `${rest}/${below}`;
}

/** Thickness as the trade says it: "3.2 mm"; for inch members "1/8 in", "1/8 in (11 ga)" or "0.120 in (11 ga)". */
export function formatThickness(mm: number, material: Material, units: UnitSystem): string {
  if (units === "metric") return formatWithUnit(mm, "thickness", units);
  const fraction = inchFraction(mm);
  const inches = fraction === null ? formatWithUnit(mm, "thickness", units) : `${fraction} in`;
  const gauge = nearestGauge(material, mm);
  return gauge === null ? inches : `${inches} (${gauge} ga)`;
}
