import type { Machine } from "#shared/contracts/machines.ts";
import type { Recipe, RecipeContent, RecipeVersion, SetpointValues } from "#shared/contracts/recipes.ts";
import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import type { TestCut } from "#shared/contracts/test-cuts.ts";
import { makeDistribution, makeGroup } from "./peer-factories.ts";

export const sampleId = (n: number) => `0b6f0d0e-0000-4000-8000-${String(n).padStart(12, "0")}`;

export const sampleMachine: Machine = {
  id: sampleId(11),
  name: "Long table",
  powerSourceMaxCurrentA: 65,
  startMethod: "contact",
  torchPressureBar: 6,
  dryness: "refrigerated",
  heightControl: "arc-voltage",
  heightControlSampleHz: null,
  topFeedMmMin: 9000,
  note: "",
  version: 1,
  recipes: 1,
  updatedAt: "2026-10-01T08:00:00.000Z",
};

export function sampleContent(
  more: Partial<Omit<RecipeContent, "setpoints">> = {},
  setpoints: Partial<SetpointValues> = {},
): RecipeContent {
  return {
    machineId: sampleMachine.id,
    material: "mild-steel",
    grade: "S235",
    surface: "clean",
    processGas: "air",
    thicknessMm: 3,
    nozzleMm: 0.8,
    note: "",
    ...more,
    setpoints: {
      currentA: 45,
      pressureBar: 4.7,
      feedMmMin: 2450,
      cutHeightMm: 1.5,
      pierceHeightMm: 3.8,
      pierceDelayS: 0.3,
      arcVoltageV: 103,
      kerfWidthMm: 1.45,
      ...setpoints,
    },
  };
}

export function sampleVersion(number: number, more: Partial<RecipeVersion> = {}): RecipeVersion {
  return {
    number,
    content: sampleContent(),
    reason: "",
    changedBy: "Ode Venn",
    changedAt: "2026-11-03T09:12:00.000Z",
    proven: true,
    origin: { kind: "typed", editionNumber: null, basis: {} },
    ...more,
  };
}

export function sampleRecipe(more: Partial<Recipe> = {}): Recipe {
  return {
    id: sampleId(1),
    machineName: sampleMachine.name,
    state: "proven",
    sharing: "private",
    testCuts: 0,
    acceptableTestCuts: 0,
    version: sampleVersion(3),
    ...more,
  };
}

export function sampleCut(more: Partial<TestCut> = {}): TestCut {
  return {
    id: sampleId(101),
    recipeId: sampleId(1),
    versionNumber: 3,
    material: "mild-steel",
    thicknessMm: 3,
    nozzleMm: 0.8,
    machineName: sampleMachine.name,
    cutAt: "2026-11-20T13:05:00.000Z",
    cutThrough: true,
    dross: "none",
    topEdge: "square",
    bevelDeg: null,
    kerfWidthMm: null,
    uMm: null,
    rz5Um: null,
    uRange: null,
    rz5Range: null,
    acceptable: true,
    note: "",
    recordedBy: "Ode Venn",
    ...more,
  };
}

const edition = { id: sampleId(900), number: 4, date: "2026-11-01" };
const group: ReleasedGroup = makeGroup({
  feedMmMin: makeDistribution(2080, 2310, 2490, { spread: Math.log(2490 / 2080) / 1.349 }),
  arcVoltageV: makeDistribution(100, 102, 104),
});

/** A server that knows the machine and one edition with figures for the sample recipe's peer group. */
export const sampleAnswers = {
  "GET /api/machines": { items: [sampleMachine] },
  "GET /api/editions/current": { edition },
  [`GET /api/editions/${edition.id}/materials/mild-steel/air`]: {
    edition,
    groups: [group],
    network: { exponents: [] },
  },
};
