import type { Machine } from "#shared/contracts/machines.ts";
import type { StartingRecipeQuery } from "#shared/contracts/starting-recipes.ts";
import { type Material, materials, type ProcessGas, processGases } from "#shared/materials/materials.ts";
import { nozzleRangeMm, type Range, thicknessRangeMm } from "#shared/recipes/metrics.ts";

/** The answers as the URL keeps them: lengths in mm whatever was typed, so that a link means the same to everybody. */
export const noAnswers = { metal: "mild-steel", gas: "air", thickness: "", nozzle: "", machine: "" };
export type AnswersInUrl = typeof noAnswers;

export interface Answers {
  material: Material;
  gas: ProcessGas;
  /** mm; undefined while nothing that can be read is typed. */
  thicknessMm: number | undefined;
  /** mm; undefined asks for advice. */
  nozzleMm: number | undefined;
  machine: Machine;
}

/** What a URL says, as far as it can be true; anything else counts as not answered. */
export function readAnswers(url: AnswersInUrl, machines: readonly [Machine, ...Machine[]]): Answers {
  return {
    material: materials.find((name) => name === url.metal) ?? "mild-steel",
    gas: processGases.find((name) => name === url.gas) ?? "air",
    thicknessMm: lengthWithin(url.thickness, thicknessRangeMm),
    nozzleMm: lengthWithin(url.nozzle, nozzleRangeMm),
    machine: machines.find(({ id }) => id === url.machine) ?? machines[0],
  };
}

function lengthWithin(text: string, { min, max }: Range): number | undefined {
  const mm = text === "" ? Number.NaN : Number(text);
  return mm >= min && mm <= max ? mm : undefined;
}

/** What is asked of the server; null while the thickness is missing. */
export function queryOf({ material, gas, thicknessMm, nozzleMm, machine }: Answers): StartingRecipeQuery | null {
  if (thicknessMm === undefined) return null;
  return { material, gas, thicknessMm, machineId: machine.id, ...(nozzleMm === undefined ? {} : { nozzleMm }) };
}
