import type { RecipeContent, RecipeState, SharingLevel } from "#shared/contracts/recipes.ts";
import { type Material, materialLabels } from "#shared/materials/materials.ts";
import type { PeerGroupSubject } from "#shared/peers/peer-group.ts";
import { formatThickness, formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

export const recipeStateLabels: Record<RecipeState, string> = {
  draft: "Not proven",
  proven: "Proven",
  retired: "Retired",
};

export const sharingLevelLabels: Record<SharingLevel, string> = {
  private: "Private",
  counted: "Counted",
  listed: "Listed",
};

interface Cut {
  material: Material;
  thicknessMm: number;
  nozzleMm: number;
}

/** What the shop calls a recipe: "Mild steel, 3 mm, 0.8 mm nozzle". */
export function recipeName({ material, thicknessMm, nozzleMm }: Cut, units: UnitSystem): string {
  const thickness = formatThickness(thicknessMm, material, units);
  return `${materialLabels[material]}, ${thickness}, ${formatWithUnit(nozzleMm, "nozzle", units)} nozzle`;
}

/** What of a recipe decides whom it is compared with. */
export function peerSubjectOf({ material, thicknessMm, nozzleMm, processGas: gas }: RecipeContent): PeerGroupSubject {
  return { material, thicknessMm, nozzleMm, gas };
}
