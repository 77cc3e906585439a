import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { type CsvColumn, writeCsv } from "#server/http/csv.ts";
import type { BookExport, Recipe, RecipeVersion } from "#shared/contracts/recipes.ts";
import { materialLabels, processGasLabels, surfaceLabels } from "#shared/materials/materials.ts";
import type { Metric } from "#shared/recipes/metrics.ts";
import { presentRecipe, presentVersion } from "./recipe-content.ts";
import * as queries from "./recipes.queries.ts";

type Book = z.infer<typeof BookExport>;

/** Name a browser saves the book under; the day in UTC. */
export function bookFilename(now: Date, extension: "json" | "csv"): string {
  return `tempermark-book-${now.toISOString().slice(0, 10)}.${extension}`;
}

export async function exportBook(tx: Db, actor: ShopActor, now: Date): Promise<Book> {
  const rows = await queries.listBook(tx, actor.shopId);
  const versions = new Map<string, RecipeVersion[]>(rows.map(({ id }) => [id, []]));
  const newest = new Map(rows.map(({ id, version }) => [id, version.number]));
  for (const { version, changedBy } of await queries.listVersions(tx, actor.shopId)) {
    // Read a moment later than the recipes: what was saved in between is left to the next export.
    if (version.number > (newest.get(version.recipeId) ?? 0)) continue;
    versions.get(version.recipeId)?.push(presentVersion(version, changedBy));
  }
  return {
    schemaVersion: 1,
    exportedAt: now.toISOString(),
    units: "Each field's name ends in its unit: A, bar gauge, mm/min, mm, s, V",
    recipes: rows.map((row) => ({ ...presentRecipe(row), versions: versions.get(row.id) ?? [] })),
  };
}

const setpoint = (header: string, metric: Metric): CsvColumn<Recipe> => ({
  header,
  value: ({ version }) => version.content.setpoints[metric],
});

const columns: readonly CsvColumn<Recipe>[] = [
  { header: "Recipe", value: ({ id }) => id },
  { header: "State", value: ({ state }) => state },
  { header: "Sharing", value: ({ sharing }) => sharing },
  { header: "Machine", value: ({ machineName }) => machineName },
  { header: "Material", value: ({ version }) => materialLabels[version.content.material] },
  { header: "Grade", value: ({ version }) => version.content.grade },
  { header: "Surface", value: ({ version }) => surfaceLabels[version.content.surface] },
  { header: "Process gas", value: ({ version }) => processGasLabels[version.content.processGas] },
  { header: "Thickness (mm)", value: ({ version }) => version.content.thicknessMm },
  { header: "Nozzle (mm)", value: ({ version }) => version.content.nozzleMm },
  setpoint("Current (A)", "currentA"),
  setpoint("Gas pressure (bar gauge)", "pressureBar"),
  setpoint("Feed rate (mm/min)", "feedMmMin"),
  setpoint("Cut height (mm)", "cutHeightMm"),
  setpoint("Pierce height (mm)", "pierceHeightMm"),
  setpoint("Pierce delay (s)", "pierceDelayS"),
  setpoint("Arc voltage (V)", "arcVoltageV"),
  setpoint("Kerf width (mm)", "kerfWidthMm"),
  { header: "Test cuts", value: ({ testCuts }) => testCuts },
  { header: "Acceptable test cuts", value: ({ acceptableTestCuts }) => acceptableTestCuts },
  { header: "Version", value: ({ version }) => version.number },
  { header: "Changed (UTC)", value: ({ version }) => version.changedAt },
  { header: "Changed by", value: ({ version }) => version.changedBy },
  { header: "Reason", value: ({ version }) => version.reason },
  { header: "Note", value: ({ version }) => version.content.note },
];

export async function exportBookAsCsv(tx: Db, actor: ShopActor): Promise<string> {
  const rows = await queries.listBook(tx, actor.shopId);
  return writeCsv(columns, rows.map(presentRecipe));
}
