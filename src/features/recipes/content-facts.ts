import type { RecipeContent } from "#shared/contracts/recipes.ts";
import { materialLabels, processGasLabels, surfaceLabels } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatThickness, formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

const notSet = "Not set";

export interface ContentFact {
  name: string;
  /** As a person reads it; "Not set" where there is nothing. */
  value: string;
}

/**
 * A recipe's content as facts in reading order, for histories and comparisons.
 * @param machineName  of a machine's id
 */
export function contentFacts(
  content: RecipeContent,
  units: UnitSystem,
  machineName: (id: string) => string,
): ContentFact[] {
  const facts: [string, string][] = [
    ["Machine", machineName(content.machineId)],
    ["Metal", materialLabels[content.material]],
    ["Grade", content.grade],
    ["Surface", surfaceLabels[content.surface]],
    ["Gas", processGasLabels[content.processGas]],
    ["Thickness", formatThickness(content.thicknessMm, content.material, units)],
    ["Nozzle", formatWithUnit(content.nozzleMm, "nozzle", units)],
    ...metrics.map((metric): [string, string] => {
      const value = content.setpoints[metric];
      const { label, quantity } = metricDefinitions[metric];
      return [label, value === null ? "" : formatWithUnit(value, quantity, units)];
    }),
    ["Note to self", content.note],
  ];
  return facts.map(([name, value]) => ({ name, value: value === "" ? notSet : value }));
}

export interface ContentChange {
  name: string;
  before: string;
  after: string;
}

/** What differs between two contents as a person reads them. A change too small to show is none. */
export function contentChanges(
  before: RecipeContent,
  after: RecipeContent,
  units: UnitSystem,
  machineName: (id: string) => string,
): ContentChange[] {
  const later = contentFacts(after, units, machineName);
  return contentFacts(before, units, machineName).flatMap(({ name, value }, i) => {
    const now = later[i]!.value; // both list the same facts
    return value === now ? [] : [{ name, before: value, after: now }];
  });
}

/** A change in one line: "Feed rate 2,310 → 2,450 mm/min". */
export function changeLine({ name, before, after }: ContentChange): string {
  if (name === "Note to self") return before === notSet ? "Note to self added" : "Note to self changed";
  const unit = sharedUnit(before, after);
  const [from, to] = [unit ? before.slice(0, -unit.length) : before, after].map((text) =>
    text === notSet ? notSet.toLowerCase() : text,
  );
  return `${name} ${from} → ${to}`;
}

/** The unit both figures end in, so that it is said once. */
function sharedUnit(before: string, after: string): string {
  const unit = / [a-zA-Z/]+$/.exec(after)?.[0] ?? "";
  const isFigure = /^[\d.,]+ [a-zA-Z/]+$/;
  return isFigure.test(before) && isFigure.test(after) && before.endsWith(unit) ? unit : "";
}
