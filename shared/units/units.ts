import type { Quantity } from "../recipes/metrics.ts";

export const unitSystems = ["metric", "inch"] as const;
export type UnitSystem = (typeof unitSystems)[number];

/** A quantity as a form or a table means it: sheet thickness may be typed as a gauge, and is shown in fractions. */
export type TypedQuantity = Quantity | "thickness" | "nozzle";

export function isLength(quantity: TypedQuantity): boolean {
  return quantity === "length" || quantity === "thickness" || quantity === "nozzle";
}

/** Exact by definition: the inch is 25.4 mm, the pound 0.45359237 kg, standard gravity 9.80665 m/s², the bar 100 kPa. */
export const mmPerInch = 25.4;
export const barPerPsi = (0.45359237 * 9.80665) / (mmPerInch / 1000) ** 2 / 1e5;

export interface Unit {
  /** As written in the interface. */
  label: string;
  /** Stored value = typed value × factor. */
  factor: number;
}

const mm: Unit = { label: "mm", factor: 1 };
const inch: Unit = { label: "in", factor: mmPerInch };
const same = (unit: Unit): Record<UnitSystem, Unit> => ({ metric: unit, inch: unit });

/** The unit a member of each system reads a quantity in, and a bare number is taken in. */
export const memberUnits: Record<TypedQuantity, Record<UnitSystem, Unit>> = {
  current: same({ label: "A", factor: 1 }),
  voltage: same({ label: "V", factor: 1 }),
  delay: same({ label: "s", factor: 1 }),
  pressure: { metric: { label: "bar", factor: 1 }, inch: { label: "psi", factor: barPerPsi } },
  feed: { metric: { label: "mm/min", factor: 1 }, inch: { label: "in/min", factor: mmPerInch } },
  length: { metric: mm, inch },
  thickness: { metric: mm, inch },
  // Nozzle orifices are marked and sold in millimetres, in inch shops too. Common practice, no source.
  nozzle: same(mm),
};

const length: Record<string, number> = {
  mm: 1,
  cm: 10,
  m: 1000,
  in: mmPerInch,
  ft: 12 * mmPerInch,
  thou: mmPerInch / 1000,
  um: 0.001,
};

/** Units a person may type for each kind of quantity, by their plainest spelling, in stored units. */
export const typedUnits: Record<TypedQuantity, Record<string, number>> = {
  current: { a: 1, ma: 0.001 },
  voltage: { v: 1, mv: 0.001, kv: 1000 },
  delay: { s: 1, ms: 0.001, min: 60 },
  pressure: { bar: 1, mbar: 0.001, psi: barPerPsi, kpa: 0.01, mpa: 10, pa: 1e-5, "kgf/cm2": 0.980665 },
  feed: {
    "mm/min": 1,
    "mm/s": 60,
    "cm/min": 10,
    "m/min": 1000,
    "m/s": 60_000,
    "in/min": mmPerInch,
    "in/s": 60 * mmPerInch,
    "ft/min": 12 * mmPerInch,
  },
  length,
  thickness: length,
  nozzle: length,
};
