import type { MachineInput } from "#shared/contracts/machines.ts";
import { drynessLabels, heightControlLabels, startMethodLabels } from "#shared/contracts/machines.ts";
import type { Recipe, RecipeContent, SharingLevel } from "#shared/contracts/recipes.ts";
import type { MachineTraits } from "#shared/contracts/released-figures.ts";
import type { SharingPreview } from "#shared/contracts/sharing.ts";
import { type ContributingMachine, namelessCopy } from "#shared/disclosure/listed-recipe.ts";
import { defaultDisclosureParameters } from "#shared/disclosure/parameters.ts";
import type { OwnNames } from "#shared/disclosure/text-screening.ts";
import { materialLabels, processGasLabels, surfaceLabels } from "#shared/materials/materials.ts";
import { bandLabel, type PeerGroupSubject, peerGroupOf } from "#shared/peers/peer-group.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatDate } from "#shared/units/dates.ts";
import { formatWithUnit } from "#shared/units/format.ts";

/** A recipe with all of the shop's own that stands around it. */
export interface PreviewSubject {
  recipe: Recipe;
  machine: MachineInput;
  own: Required<OwnNames>;
  /** ISO 8601; null while the version is not proven. */
  provenAt: string | null;
  units: "metric" | "inch";
}

type Kept = SharingPreview["staysHere"][number];

export function subjectOf({ material, thicknessMm, nozzleMm, processGas: gas }: RecipeContent): PeerGroupSubject {
  return { material, thicknessMm, nozzleMm, gas };
}

function labelOf(content: RecipeContent): string {
  const key = peerGroupOf(subjectOf(content));
  return `${materialLabels[key.material]}, ${bandLabel(key.bandIndex)}, ${key.nozzleMm} mm nozzle, ${processGasLabels[key.gas].toLowerCase()}`;
}

/** What others could come to see of a recipe at a level, made by the code that makes it for an edition. */
export function previewSharing(subject: PreviewSubject, level: SharingLevel, text: string): SharingPreview {
  return {
    level,
    counts: level !== "private",
    groupLabel: labelOf(subject.recipe.version.content),
    listed: level === "listed" ? listedCopy(subject, text) : null,
    staysHere: [...alwaysKept(subject), ...keptUnlessListed(subject, level, text)],
  };
}

/**
 * As if enough shops had a machine like this one. An edition leaves out a trait that few share, but how many do cannot be
 * asked: so the owner sees the most that could come to be shown.
 */
function listedCopy({ recipe, machine, own, provenAt }: PreviewSubject, text: string) {
  const { content, changedAt } = recipe.version;
  const { startMethod, dryness, heightControl } = machine;
  const traits: MachineTraits = { startMethod, dryness, heightControl };
  const alike = Array.from(
    { length: defaultDisclosureParameters.traitShops },
    (_, shop): ContributingMachine => ({ shop, traits }),
  );
  const { setpoints } = content;
  const source = { ...subjectOf(content), setpoints, changedAt: provenAt ?? changedAt, text, traits };
  return namelessCopy(source, alike, own, defaultDisclosureParameters);
}

function alwaysKept({ recipe, machine, own, provenAt, units }: PreviewSubject): Kept[] {
  const { content, number, changedAt } = recipe.version;
  const setpoints = metrics.flatMap((metric) => {
    const value = content.setpoints[metric];
    const { label, quantity } = metricDefinitions[metric];
    return value === null ? [] : [`${label.toLowerCase()} ${formatWithUnit(value, quantity, units)}`];
  });
  return filled([
    ["Shop", own.shop],
    ["People", own.people.join(", ")],
    ["Machine", machine.name],
    ["Note on the machine", machine.note],
    ["Note on the recipe", content.note],
    ["Grade", content.grade],
    ["Surface", surfaceLabels[content.surface]],
    ["Exact thickness", formatWithUnit(content.thicknessMm, "thickness", units)],
    ["Exact nozzle", formatWithUnit(content.nozzleMm, "nozzle", units)],
    ["Exact setpoints", setpoints.join(", ")],
    ["Last changed", formatDate(changedAt)],
    ["Proven", provenAt ? formatDate(provenAt) : ""],
    ["History", number === 1 ? "1 version" : `${number} versions`],
    ["Test cuts", recipe.testCuts === 0 ? "" : `${recipe.testCuts}, with what was seen, measured and noted`],
  ]);
}

function keptUnlessListed({ machine }: PreviewSubject, level: SharingLevel, text: string): Kept[] {
  if (level === "listed") return [];
  return filled([
    ["Start of the arc", startMethodLabels[machine.startMethod]],
    ["Air", drynessLabels[machine.dryness]],
    ["Height control", heightControlLabels[machine.heightControl]],
    ["Words for others", text],
  ]);
}

function filled(rows: readonly [what: string, value: string][]): Kept[] {
  return rows.filter(([, value]) => value !== "").map(([what, value]) => ({ what, value }));
}
