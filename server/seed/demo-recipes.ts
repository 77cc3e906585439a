import type { machines } from "#server/db/schema/machines.ts";
import type { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import type { recipes } from "#server/db/schema/recipes.ts";
import type { shares } from "#server/db/schema/shares.ts";
import type { testCuts } from "#server/db/schema/test-cuts.ts";
import { drynessLevels, startMethods } from "#shared/contracts/machines.ts";
import type { Material } from "#shared/materials/materials.ts";
import { peerGroupId, peerGroupOf } from "#shared/peers/peer-group.ts";
import {
  type SimulatedMachine,
  type SimulatedRecipe,
  simulateRecipe,
  type WritingHabit,
} from "#shared/simulation/network.ts";
import type { Random } from "#shared/simulation/random.ts";

type New<Table extends { $inferInsert: unknown }> = Table["$inferInsert"];
export type NewMachine = New<typeof machines> & { id: string };

export interface RecipeRows {
  recipe: New<typeof recipes>;
  versions: New<typeof recipeVersions>[];
  cuts: New<typeof testCuts>[];
  share: New<typeof shares> | undefined;
}

const dayMs = 24 * 3600_000;

/** A version 4 UUID (RFC 9562) from the seeded stream, so that the demo network is the same each time. */
export function inventId(random: Random): string {
  const hex = Array.from({ length: 30 }, () => random.whole(0, 15).toString(16)).join("");
  const variant = random.pick(["8", "9", "a", "b"]);
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(12, 15)}-${variant}${hex.slice(15, 18)}-${hex.slice(18, 30)}`;
}

export function inventMachine(random: Random, shopId: string, name: string, simulated: SimulatedMachine): NewMachine {
  const heightControl = random.pick(["arc-voltage", "arc-voltage", "arc-voltage", "manual", "none"] as const);
  return {
    id: inventId(random),
    shopId,
    name,
    powerSourceMaxCurrentA: simulated.maxCurrentA,
    startMethod: random.pick(startMethods),
    torchPressureBar: random.chance(0.15) ? null : random.whole(48, 62) / 10,
    dryness: random.pick(drynessLevels),
    heightControl,
    heightControlSampleHz: heightControl === "arc-voltage" ? random.pick([10, 50, 100, 200, 500]) : null,
    topFeedMmMin: simulated.topFeedMmMin,
    note: "",
  };
}

export interface BookPlan {
  shopId: string;
  machine: NewMachine;
  simulated: SimulatedMachine;
  habit: WritingHabit;
  people: readonly string[];
  /** How many recipes to keep for the machine, and between which days. */
  recipes: number;
  from: Date;
  until: Date;
  avoid?: readonly Material[];
}

/** A machine's recipes, one a peer group for the most part, as a shop gathers them over time. */
export function inventBook(random: Random, plan: BookPlan): RecipeRows[] {
  const seen = new Set<string>();
  const rows: RecipeRows[] = [];
  for (let tries = 0; rows.length < plan.recipes && tries < plan.recipes * 20; tries++) {
    const simulated = simulateRecipe(random, plan.simulated, plan.habit);
    const group = peerGroupId(peerGroupOf({ ...simulated, gas: "air" }));
    if (plan.avoid?.includes(simulated.material)) continue;
    if (seen.has(group) && !random.chance(0.1)) continue;
    seen.add(group);
    rows.push(inventRecipe(random, plan, simulated));
  }
  return rows;
}

function inventRecipe(random: Random, plan: BookPlan, simulated: SimulatedRecipe): RecipeRows {
  const recipeId = inventId(random);
  const { shopId } = plan;
  const begun = new Date(
    plan.from.getTime() + random.next() * (plan.until.getTime() - plan.from.getTime() - 20 * dayMs),
  );
  const proven = !simulated.wild ? random.chance(0.82) : random.chance(0.5);
  const versions = inventVersions(random, plan, simulated, recipeId, begun);
  const newest = versions.at(-1)!; // inventVersions gives one at least
  const cuts = inventCuts(random, plan, newest, proven);
  newest.provenAt = proven ? cuts.at(-1)!.cutAt : null; // a proven recipe has a cut
  const state = random.chance(0.03) ? "retired" : proven ? "proven" : "draft";
  const shared = proven && random.chance(0.85);
  return {
    recipe: {
      id: recipeId,
      shopId,
      state,
      currentVersion: newest.number,
      createdAt: begun,
      changedAt: newest.changedAt!,
    },
    versions,
    cuts,
    share: shared
      ? {
          recipeId,
          shopId,
          level: random.chance(0.3) ? "listed" : "counted",
          sharedAt: newest.provenAt!,
          publicText: "",
        }
      : undefined,
  };
}

const reasons = [
  "Less dross",
  "New nozzle, volts again",
  "Slower for the corners",
  "Cleaner top edge",
  "Quicker, still clean",
];

function inventVersions(random: Random, plan: BookPlan, simulated: SimulatedRecipe, recipeId: string, begun: Date) {
  const { setpoints, material, thicknessMm, nozzleMm } = simulated;
  const count = random.pick([1, 1, 1, 2, 2, 3]);
  const surface = material === "mild-steel" && random.chance(0.3) ? "mill-scale" : "clean";
  return Array.from({ length: count }, (_, i): New<typeof recipeVersions> => {
    // Earlier versions ran a little slower: people creep up on a feed.
    const earlier =
      setpoints.feedMmMin === null
        ? null
        : Math.max(50, Math.round((setpoints.feedMmMin * (1 - 0.05 * (count - 1 - i))) / 10) * 10);
    return {
      recipeId,
      shopId: plan.shopId,
      number: i + 1,
      machineId: plan.machine.id,
      material,
      grade: "",
      surface,
      processGas: "air",
      thicknessMm,
      nozzleMm,
      ...setpoints,
      feedMmMin: i === count - 1 ? setpoints.feedMmMin : earlier,
      note: "",
      reason: i === 0 ? "" : random.pick(reasons),
      origin: { kind: "typed", editionNumber: null, basis: {} },
      changedBy: random.pick(plan.people),
      changedAt: new Date(begun.getTime() + i * 4 * dayMs),
      provenAt: null,
    };
  });
}

function inventCuts(random: Random, plan: BookPlan, version: New<typeof recipeVersions>, proven: boolean) {
  const count = proven ? random.pick([1, 1, 2, 3]) : random.pick([0, 0, 1]);
  return Array.from({ length: count }, (_, i): New<typeof testCuts> => {
    const good = proven && i === count - 1;
    const measured = random.chance(0.25);
    return {
      id: inventId(random),
      shopId: plan.shopId,
      recipeId: version.recipeId,
      versionNumber: version.number,
      cutAt: new Date(version.changedAt!.getTime() + ((i + 1) * 24 + random.whole(0, 9)) * 3600_000),
      cutThrough: good || random.chance(0.8),
      dross: good ? random.pick(["none", "none", "light"]) : random.pick(["moderate", "heavy", "light"]),
      topEdge: good
        ? random.pick(["square", "slightly-rounded"])
        : random.pick(["slightly-rounded", "rounded", "melted"]),
      bevelDeg: measured ? Math.round(random.normal() * 15) / 10 : null,
      kerfWidthMm: measured ? (version.kerfWidthMm ?? null) : null,
      uMm: measured ? Math.round((0.1 + Math.abs(random.normal()) * 0.15) * 100) / 100 : null,
      rz5Um: measured && random.chance(0.3) ? random.whole(15, 80) : null,
      acceptable: good,
      note: "",
      recordedBy: random.pick(plan.people),
    };
  });
}
