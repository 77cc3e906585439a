import type { Control, FieldPath } from "react-hook-form";
import { z } from "zod";
import { RecipeContent } from "#shared/contracts/recipes.ts";
import type { Material, ProcessGas, Surface } from "#shared/materials/materials.ts";
import { checkSetpoint, fieldLimits, type LimitedField, type RecipeFigures } from "#shared/recipes/limits.ts";
import { forEachMetric, type Metric, metrics } from "#shared/recipes/metrics.ts";
import { editText, formatWithUnit } from "#shared/units/format.ts";
import { parseQuantity } from "#shared/units/parse.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import type { QuantityReading } from "../../ui/quantity-field.tsx";

/** A recipe as its form holds it: figures as typed. */
export interface RecipeFormValues {
  machineId: string;
  material: Material;
  grade: string;
  surface: Surface;
  processGas: ProcessGas;
  thicknessMm: string;
  nozzleMm: string;
  setpoints: Record<Metric, string>;
  note: string;
  reason: string;
  /** The version the change began with. A restored draft keeps its own, so that it cannot undo a newer one unseen. */
  baseVersion: number;
}

export interface RecipeFormOutput {
  content: RecipeContent;
  reason: string;
  baseVersion: number;
}

export type RecipeControl = Control<RecipeFormValues, unknown, RecipeFormOutput>;

interface FieldRule {
  field: LimitedField;
  units: UnitSystem;
  material: Material;
}

type Figure = { ok: true; value: number | null } | { ok: false; problem: string };

/** What was typed as a figure, in the stored unit; nothing typed is null. */
export function readFigure(text: string, { field, units, material }: FieldRule): Figure {
  if (text.trim() === "") return { ok: true, value: null };
  const parsed = parseQuantity(text, fieldLimits[field].quantity, units, { material });
  if (!parsed.ok) return parsed;
  const check = checkSetpoint(field, parsed.value, units);
  return check.kind === "refuse" ? { ok: false, problem: check.detail } : parsed;
}

/** The reading that stands below a field while it is typed. An odd value is said to be odd at once. */
export function figureReading(rule: FieldRule): (text: string) => QuantityReading {
  return (text) => {
    const read = readFigure(text, rule);
    if (!read.ok) return read;
    if (read.value === null) return { ok: true, text: "" };
    const check = checkSetpoint(rule.field, read.value, rule.units);
    const shown = formatWithUnit(read.value, fieldLimits[rule.field].quantity, rule.units);
    return { ok: true, text: check.kind === "ask" ? `${shown}. ${check.detail}` : shown };
  };
}

/** The figures that can be read so far, for whatever is said live beside the form. */
export function figuresSoFar(values: RecipeFormValues, units: UnitSystem): Required<RecipeFigures> {
  const read = (field: LimitedField, text: string) => {
    const figure = readFigure(text, { field, units, material: values.material });
    return figure.ok ? figure.value : null;
  };
  return {
    ...forEachMetric((metric) => read(metric, values.setpoints[metric])),
    thicknessMm: read("thicknessMm", values.thicknessMm),
    nozzleMm: read("nozzleMm", values.nozzleMm),
  };
}

/**
 * From what is typed to what is sent. Read as a whole, because a gauge means another thickness in another metal; every
 * field that is wrong is named at once.
 */
export function recipeFormSchema(units: UnitSystem): z.ZodType<RecipeFormOutput, RecipeFormValues> {
  return z.custom<RecipeFormValues>().transform((values, context) => {
    const refuse = (path: PropertyKey[], message: string) => context.addIssue({ code: "custom", path, message });
    const take = (field: LimitedField, text: string, path: string[]) => {
      const figure = readFigure(text, { field, units, material: values.material });
      if (!figure.ok) refuse(path, figure.problem);
      return figure.ok ? figure.value : Number.NaN;
    };
    const needed = (field: "thicknessMm" | "nozzleMm") => {
      const value = take(field, values[field], [field]);
      if (value === null) refuse([field], "Fill this in");
      return value ?? Number.NaN;
    };
    const setpoints = forEachMetric((metric) => take(metric, values.setpoints[metric], ["setpoints", metric]));
    const { reason, baseVersion, ...rest } = values;
    const thicknessMm = needed("thicknessMm");
    const nozzleMm = needed("nozzleMm");
    if (values.machineId === "") refuse(["machineId"], "Choose the machine it is cut on");
    if (reason.length > 300) refuse(["reason"], "Keep it under 300 letters");
    if (context.issues.length > 0) return z.NEVER;
    const content = RecipeContent.safeParse({ ...rest, thicknessMm, nozzleMm, setpoints });
    if (content.success) return { content: content.data, reason: reason.trim(), baseVersion };
    for (const issue of content.error.issues) refuse(issue.path, issue.message);
    return z.NEVER;
  });
}

export function emptyRecipe(machineId: string): RecipeFormValues {
  return {
    machineId,
    material: "mild-steel",
    grade: "",
    surface: "clean",
    processGas: "air",
    thicknessMm: "",
    nozzleMm: "",
    setpoints: forEachMetric(() => ""),
    note: "",
    reason: "",
    baseVersion: 0,
  };
}

/** What the form holds to begin with. */
export function recipeValues(content: RecipeContent, units: UnitSystem, baseVersion: number): RecipeFormValues {
  const text = (field: LimitedField, value: number | null) =>
    value === null ? "" : editText(value, fieldLimits[field].quantity, units);
  return {
    ...content,
    thicknessMm: text("thicknessMm", content.thicknessMm),
    nozzleMm: text("nozzleMm", content.nozzleMm),
    setpoints: forEachMetric((metric) => text(metric, content.setpoints[metric])),
    reason: "",
    baseVersion,
  };
}

const subjectFields = [
  "machineId",
  "material",
  "grade",
  "surface",
  "processGas",
  "thicknessMm",
  "nozzleMm",
  "note",
] as const;

/** Where the request names a field otherwise than the form. */
export const recipeFieldNames: Record<string, FieldPath<RecipeFormValues>> = Object.fromEntries([
  ...subjectFields.map((name) => [`/content/${name}`, name] as const),
  ...metrics.map((metric) => [`/content/setpoints/${metric}`, `setpoints.${metric}`] as const),
]);
