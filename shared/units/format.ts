import type { Material } from "../materials/materials.ts";
import type { Range } from "../recipes/metrics.ts";
import { nearestGauge } from "./gauges.ts";
import { memberUnits, mmPerInch, type TypedQuantity, type UnitSystem } from "./units.ts";

export type { TypedQuantity } from "./units.ts";

/** Digits behind the point, at most, on screen. */
const places: Record<TypedQuantity, Record<UnitSystem, number>> = {
  current: { metric: 1, inch: 1 },
  voltage: { metric: 1, inch: 1 },
  delay: { metric: 2, inch: 2 },
  pressure: { metric: 2, inch: 1 },
  feed: { metric: 0, inch: 1 },
  length: { metric: 2, inch: 3 },
  thickness: { metric: 2, inch: 3 },
  nozzle: { metric: 2, inch: 3 },
};

export interface Shown {
  text: string;
  unit: string;
}

const number = (digits: number) => new Intl.NumberFormat("en", { maximumFractionDigits: digits });
const numberFormats = Array.from({ length: 7 }, (_, digits) => number(digits));

/** A number in English digits, "2,450.5", with at most so many places. The one number formatter. */
export function formatNumber(value: number, maxPlaces = 0): string {
  return (numberFormats[maxPlaces] ?? number(maxPlaces)).format(value);
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

/** A stored value as the member reads it. */
export function formatQuantity(value: number, quantity: TypedQuantity, units: UnitSystem): Shown {
  const unit = memberUnits[quantity][units];
  return { text: formatNumber(value / unit.factor, places[quantity][units]), unit: unit.label };
}

/** The same as one piece of text: "2,450 mm/min". */
export function formatWithUnit(value: number, quantity: TypedQuantity, units: UnitSystem): string {
  const { text, unit } = formatQuantity(value, quantity, units);
  return `${text} ${unit}`;
}

/** An allowed range: "10 to 400 A". Rounded inwards, so that what it names is allowed. */
export function limitText(range: Range, quantity: TypedQuantity, units: UnitSystem): string {
  const unit = memberUnits[quantity][units];
  const step = 10 ** places[quantity][units];
  // A hair of slack, or 25.4/25.4 would round up past itself.
  const from = Math.ceil((range.min / unit.factor) * step - 1e-9) / step;
  const to = Math.floor((range.max / unit.factor) * step + 1e-9) / step;
  const text = (value: number) => formatNumber(value, places[quantity][units]);
  return `${text(from)} to ${text(to)} ${unit.label}`;
}

/** What a field holds to begin with: exact enough that saving it again changes nothing. */
export function editText(value: number, quantity: TypedQuantity, units: UnitSystem): string {
  const shown = value / memberUnits[quantity][units].factor;
  // Ten figures: below what conversion rounds, above what anybody measures.
  return String(Number(shown.toPrecision(10)));
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

/** Thickness as the trade says it: "3.2 mm"; for inch members "1/8 in", "11 ga (0.12 in)" or "0.1 in". */
export function formatThickness(mm: number, material: Material, units: UnitSystem): string {
  if (units === "metric") return `${formatNumber(mm, 2)} mm`;
  const decimal = `${formatNumber(mm / mmPerInch, 3)} in`;
  const gauge = nearestGauge(material, mm);
  if (gauge !== null) return `${gauge} ga (${decimal})`;
  const fraction = inchFraction(mm);
  return fraction === null ? decimal : `${fraction} in`;
}
