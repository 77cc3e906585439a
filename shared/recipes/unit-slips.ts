import { formatNumber, toDisplayNumber } from "../units/format.ts";
import { memberUnits, mmPerInch, type TypedQuantity, typedUnits, type UnitSystem } from "../units/units.ts";
import type { Range } from "./metrics.ts";

const lengths = [
  { label: "mm", factor: 1 },
  { label: "in", factor: mmPerInch },
];

/** Units a gauge, a drawing or another program shows, so that a bare figure may have been meant in them. */
const mistakable: Record<TypedQuantity, readonly { label: string; factor: number }[]> = {
  current: [],
  voltage: [],
  delay: [{ label: "ms", factor: typedUnits.delay.ms! }], // in its own table, as all below
  pressure: [
    { label: "bar", factor: 1 },
    { label: "psi", factor: typedUnits.pressure.psi! },
    { label: "kPa", factor: typedUnits.pressure.kpa! },
  ],
  feed: [
    { label: "mm/min", factor: 1 },
    { label: "in/min", factor: typedUnits.feed["in/min"]! },
    { label: "mm/s", factor: typedUnits.feed["mm/s"]! },
    { label: "m/min", factor: typedUnits.feed["m/min"]! },
  ],
  length: lengths,
  thickness: lengths,
  nozzle: lengths,
};

/**
 * What an odd value may have been meant as: the same digits in another unit, where that is a usual value.
 * @param value  stored unit
 * @param usual  stored unit
 * @returns such as ["65 psi"] for 65 bar; empty where no unit explains it
 */
export function likelyMeant(value: number, quantity: TypedQuantity, usual: Range, units: UnitSystem): string[] {
  const shown = toDisplayNumber(value, quantity, units);
  const own = memberUnits[quantity][units].label;
  return mistakable[quantity]
    .filter(({ label, factor }) => label !== own && shown * factor >= usual.min && shown * factor <= usual.max)
    .map(({ label }) => `${formatNumber(shown, 3)} ${label}`);
}
