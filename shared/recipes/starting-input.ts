import type { NetworkFigures, ReleasedGroup } from "../contracts/released-figures.ts";
import type { Material, ProcessGas } from "../materials/materials.ts";
import type { UnitSystem } from "../units/units.ts";

/** What of a machine bends a starting recipe. */
export interface MachineLimits {
  powerSourceMaxCurrentA: number;
  topFeedMmMin: number;
  /** Available at the torch while it flows, bar gauge; null where nobody has measured it. */
  torchPressureBar: number | null;
}

export interface StartingRecipeInput {
  material: Material;
  thicknessMm: number;
  gas: ProcessGas;
  /** Null: advise one. */
  nozzleMm: number | null;
  machine: MachineLimits;
  /** Released groups of the material; those of other gases are passed over. */
  groups: readonly ReleasedGroup[];
  network: NetworkFigures | null;
  /** What the words name quantities in; figures stay in stored units. */
  units: UnitSystem;
}

/** The input with the nozzle settled, as every estimate sees it. */
export interface EstimateContext extends StartingRecipeInput {
  /** Null where nobody knows one: then only the tests are left. */
  nozzleMm: number | null;
  /** The peer group itself, where it is released. */
  group: ReleasedGroup | null;
  /** Cut height already settled, for the pierce height above it; null while it is not. */
  cutHeightMm: number | null;
}
