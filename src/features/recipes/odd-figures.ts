import type { Machine } from "#shared/contracts/machines.ts";
import type { RecipeContent } from "#shared/contracts/recipes.ts";
import { heatCheck } from "#shared/materials/heat-check.ts";
import { checkLimits } from "#shared/recipes/limits.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

/** What is allowed but worth a second look: values seldom right, values the machine cannot give, heat that is not there. */
export function oddFigures(content: RecipeContent, machine: Machine | undefined, units: UnitSystem): string[] {
  const { thicknessMm, nozzleMm, setpoints } = content;
  const seldom = checkLimits({ ...setpoints, thicknessMm, nozzleMm }, units).questions.map(({ detail }) => detail);
  const heat = heatCheck({ ...setpoints, thicknessMm, material: content.material, gas: content.processGas });
  const tooCold = heat?.verdict === "impossible" ? [heat.words] : [];
  return [...seldom, ...beyondMachine(content, machine, units), ...tooCold];
}

function beyondMachine({ setpoints }: RecipeContent, machine: Machine | undefined, units: UnitSystem): string[] {
  if (!machine) return [];
  const { name, powerSourceMaxCurrentA, topFeedMmMin, torchPressureBar } = machine;
  const limits = [
    { value: setpoints.currentA, most: powerSourceMaxCurrentA, quantity: "current", what: "power source gives" },
    { value: setpoints.feedMmMin, most: topFeedMmMin, quantity: "feed", what: "table cuts at" },
    { value: setpoints.pressureBar, most: torchPressureBar, quantity: "pressure", what: "torch gets" },
  ] as const;
  return limits.flatMap(({ value, most, quantity, what }) => {
    if (value === null || most === null || value <= most) return [];
    const [wanted, given] = [value, most].map((figure) => formatWithUnit(figure, quantity, units));
    return [`${wanted} is more than ${name} can do: at most ${given} is what its ${what}.`];
  });
}
