import { isDeepStrictEqual } from "node:util";
import type { Recipe, RecipeContent, RecipeVersion } from "#shared/contracts/recipes.ts";
import type { RecipeRow, VersionRow } from "./recipes.queries.ts";

/** The columns a version's content is kept in. */
export function columnsOf({ setpoints, ...rest }: RecipeContent) {
  return { ...rest, ...setpoints };
}

export function contentOf(row: VersionRow): RecipeContent {
  const { machineId, material, grade, surface, processGas, thicknessMm, nozzleMm, note } = row;
  const { currentA, pressureBar, feedMmMin, cutHeightMm, pierceHeightMm, pierceDelayS, arcVoltageV, kerfWidthMm } = row;
  return {
    ...{ machineId, material, grade, surface, processGas, thicknessMm, nozzleMm, note },
    setpoints: {
      ...{ currentA, pressureBar, feedMmMin, cutHeightMm },
      ...{ pierceHeightMm, pierceDelayS, arcVoltageV, kerfWidthMm },
    },
  };
}

export const isSameContent: (a: RecipeContent, b: RecipeContent) => boolean = isDeepStrictEqual;

/** Whether two contents lead to the same cut: everything but the private note. What a test cut says of one holds for both. */
export function isSameCut(a: RecipeContent, b: RecipeContent): boolean {
  return isDeepStrictEqual({ ...a, note: "" }, { ...b, note: "" });
}

export function presentVersion(row: VersionRow, changedBy: string | null): RecipeVersion {
  return {
    number: row.number,
    content: contentOf(row),
    reason: row.reason,
    changedBy: changedBy ?? "",
    changedAt: row.changedAt.toISOString(),
    proven: row.provenAt !== null,
    origin: row.origin,
  };
}

export function presentRecipe({ version, changedBy, sharing, place: _, ...row }: RecipeRow): Recipe {
  return { ...row, sharing: sharing ?? "private", version: presentVersion(version, changedBy) };
}
