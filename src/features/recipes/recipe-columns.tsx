import type { Recipe } from "#shared/contracts/recipes.ts";
import { materialLabels } from "#shared/materials/materials.ts";
import { type Metric, metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatThickness, formatWithUnit, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { recipeName, sharingLevelLabels } from "../../lib/recipe-words.ts";
import type { Column } from "../../ui/table.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { RecipeStateWord } from "./recipe-state.tsx";
import { SetpointCell } from "./setpoint-cell.tsx";

/** Short headers: the column's unit stands beside them. */
const headers: [Metric, string][] = [
  ["currentA", "Current"],
  ["pressureBar", "Pressure"],
  ["feedMmMin", "Feed"],
  ["cutHeightMm", "Cut height"],
  ["arcVoltageV", "Arc volts"],
];

const setpointColumn = ([metric, header]: [Metric, string], units: UnitSystem): Column<Recipe> => ({
  key: metric,
  header,
  unit: unitLabel(metricDefinitions[metric].quantity, units),
  numeric: true,
  sortable: metric !== "cutHeightMm",
  cell: (recipe) => <SetpointCell recipe={recipe} metric={metric} units={units} />,
});

/** @param narrow  for small desks: the machine stands below the metal, the cut height on the recipe's page */
export function recipeColumns(units: UnitSystem, narrow: boolean): Column<Recipe>[] {
  const columns: Column<Recipe>[] = [
    {
      key: "material",
      header: "Metal",
      rowHeader: true,
      sortable: true,
      cell: ({ id, machineName, version: { content } }) => (
        <>
          <TextLink to={`/recipes/${id}`} aria-label={recipeName(content, units)}>
            {materialLabels[content.material]}
          </TextLink>
          {narrow ? <span className="block text-sm font-normal text-muted">{machineName}</span> : null}
        </>
      ),
    },
    {
      key: "thickness",
      header: "Thickness",
      sortable: true,
      cell: ({ version: { content } }) => (
        <span className="figures">{formatThickness(content.thicknessMm, content.material, units)}</span>
      ),
    },
    {
      key: "nozzle",
      header: "Nozzle",
      sortable: true,
      cell: ({ version: { content } }) => (
        <span className="figures">{formatWithUnit(content.nozzleMm, "nozzle", units)}</span>
      ),
    },
    { key: "machine", header: "Machine", sortable: true, cell: (recipe) => recipe.machineName },
    {
      key: "state",
      header: "State, sharing",
      cell: (recipe) => (
        <>
          <RecipeStateWord state={recipe.state} />
          <span className="block pl-5 text-sm text-muted">{sharingLevelLabels[recipe.sharing]}</span>
        </>
      ),
    },
    ...headers.map((header) => setpointColumn(header, units)),
  ];
  return narrow ? columns.filter(({ key }) => key !== "machine" && key !== "cutHeightMm") : columns;
}
