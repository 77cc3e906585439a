import { type CsvColumn, writeCsv } from "#server/http/csv.ts";
import { basisLabels, type StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import { materialLabels, processGasLabels } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { memberUnits } from "#shared/units/units.ts";

interface Line {
  item: string;
  value?: string | number | null;
  low?: number | null;
  high?: number | null;
  unit?: string;
  basis?: string;
  evidence?: string;
}

const columns: readonly CsvColumn<Line>[] = [
  { header: "Item", value: ({ item }) => item },
  { header: "Value", value: ({ value }) => value ?? null },
  { header: "Low", value: ({ low }) => low ?? null },
  { header: "High", value: ({ high }) => high ?? null },
  { header: "Unit", value: ({ unit }) => unit ?? null },
  { header: "Basis", value: ({ basis }) => basis ?? null },
  { header: "Evidence", value: ({ evidence }) => evidence ?? null },
];

/**
 * A starting recipe as CSV (RFC 4180) in stored units: what it is for, then one setpoint a row, then the machine's limits
 * and the cautions, which go with it wherever it goes.
 */
export function startingRecipeCsv(recipe: StartingRecipe): string {
  const lines: Line[] = [
    { item: "Material", value: materialLabels[recipe.material] },
    { item: "Thickness", value: recipe.thicknessMm, unit: "mm" },
    { item: "Process gas", value: processGasLabels[recipe.gas] },
    { item: "Nozzle", value: recipe.nozzle.nozzleMm, unit: "mm", evidence: recipe.nozzle.reason },
    { item: "Edition", value: recipe.edition?.number ?? null, evidence: recipe.edition?.date ?? "none published yet" },
    ...metrics.map((metric) => setpointLine(recipe, metric)),
    ...recipe.limits.map(({ text }) => ({ item: "Limit of the machine", value: text })),
    ...recipe.cautions.map(({ title, text, standards }) => ({
      item: `Caution: ${title}`,
      value: text,
      evidence: standards.join(", "),
    })),
  ];
  return writeCsv(columns, lines);
}

function setpointLine({ setpoints }: StartingRecipe, metric: (typeof metrics)[number]): Line {
  const { value, low, high, basis, evidence } = setpoints[metric];
  const { label, quantity } = metricDefinitions[metric];
  return {
    item: label,
    value,
    low,
    high,
    unit: memberUnits[quantity].metric.label,
    basis: basisLabels[basis],
    evidence,
  };
}
