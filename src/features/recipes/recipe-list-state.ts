import { type recipeSorts, recipeStates, sharingLevels } from "#shared/contracts/recipes.ts";
import { type Material, materials } from "#shared/materials/materials.ts";
import { checkSetpoint } from "#shared/recipes/limits.ts";
import { parseQuantity } from "#shared/units/parse.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import type { Sort } from "../../ui/table.tsx";
import type { RecipeListInput } from "./recipes.queries.ts";

/** What the list shows, as its URL says it; a length is kept as typed ("11 ga"). */
export const listDefaults = {
  q: "",
  material: "",
  thickness: "",
  nozzle: "",
  machine: "",
  state: "",
  sharing: "",
  sort: "changed",
  order: "desc",
};
export type RecipeListState = typeof listDefaults;

type SortKey = (typeof recipeSorts)[number];

/** A column sorts by what it shows. */
const sortOfColumn: Record<string, SortKey> = {
  material: "material",
  thickness: "thickness",
  nozzle: "nozzle",
  machine: "machine",
  currentA: "current",
  pressureBar: "pressure",
  feedMmMin: "feed",
  arcVoltageV: "voltage",
  changed: "changed",
};

const sortLabels: [SortKey, "asc" | "desc", string][] = [
  ["changed", "desc", "Last changed first"],
  ["changed", "asc", "Longest unchanged first"],
  ["material", "asc", "Metal, A to Z"],
  ["material", "desc", "Metal, Z to A"],
  ["thickness", "asc", "Thinnest first"],
  ["thickness", "desc", "Thickest first"],
  ["nozzle", "asc", "Smallest nozzle first"],
  ["nozzle", "desc", "Largest nozzle first"],
  ["machine", "asc", "Machine, A to Z"],
  ["machine", "desc", "Machine, Z to A"],
  ["current", "asc", "Lowest current first"],
  ["current", "desc", "Highest current first"],
  ["pressure", "asc", "Lowest pressure first"],
  ["pressure", "desc", "Highest pressure first"],
  ["feed", "asc", "Slowest first"],
  ["feed", "desc", "Quickest first"],
  ["voltage", "asc", "Lowest arc voltage first"],
  ["voltage", "desc", "Highest arc voltage first"],
];

/** Every order there is, in words. */
export const sortChoices = sortLabels.map(([sort, order, label]) => ({ value: `${sort} ${order}`, label }));

export function tableSort({ sort, order }: RecipeListState): Sort {
  const column = Object.keys(sortOfColumn).find((key) => sortOfColumn[key] === sort) ?? "changed";
  return { key: column, direction: order === "asc" ? "asc" : "desc" };
}

export function sortPatch({ key, direction }: Sort): Pick<RecipeListState, "sort" | "order"> {
  return { sort: sortOfColumn[key] ?? "changed", order: direction };
}

export type LengthFilter = { value?: number; problem?: string };

/** A length somebody typed into a filter; nothing typed filters nothing. */
export function readLengthFilter(
  text: string,
  field: "thicknessMm" | "nozzleMm",
  units: UnitSystem,
  material?: Material,
): LengthFilter {
  if (text.trim() === "") return {};
  const quantity = field === "thicknessMm" ? "thickness" : "nozzle";
  const parsed = parseQuantity(text, quantity, units, material ? { material } : {});
  if (!parsed.ok) return { problem: parsed.problem };
  const check = checkSetpoint(field, parsed.value, units);
  return check.kind === "refuse" ? { problem: check.detail } : { value: parsed.value };
}

const oneOf = <Value extends string>(values: readonly Value[], text: string) => values.find((value) => value === text);

/** The question to the server. What a hand-edited URL gets wrong is left out rather than refused. */
export function listInput(state: RecipeListState & { cursor?: string }, units: UnitSystem): RecipeListInput {
  const material = oneOf(materials, state.material);
  const input = {
    search: state.q.trim().slice(0, 100) || undefined,
    material,
    machineId: /^[0-9a-f-]{36}$/.test(state.machine) ? state.machine : undefined,
    state: oneOf(recipeStates, state.state),
    sharing: oneOf(sharingLevels, state.sharing),
    thicknessMm: readLengthFilter(state.thickness, "thicknessMm", units, material).value,
    nozzleMm: readLengthFilter(state.nozzle, "nozzleMm", units).value,
    sort: oneOf(Object.values(sortOfColumn), state.sort) ?? "changed",
    order: state.order === "asc" ? "asc" : "desc",
    cursor: state.cursor,
  };
  return Object.fromEntries(Object.entries(input).filter(([, value]) => value !== undefined));
}

export const isFiltered = (state: RecipeListState): boolean =>
  (["q", "material", "thickness", "nozzle", "machine", "state", "sharing"] as const).some((key) => state[key] !== "");
