import type { ReleasedGroup } from "../contracts/released-figures.ts";
import type { StartingHeatCheck, StartingRecipe, StartingSetpoint } from "../contracts/starting-recipe-figures.ts";
import { heatCheck } from "../materials/heat-check.ts";
import { peerGroupId, peerGroupOf } from "../peers/peer-group.ts";
import { cautionsFor } from "../safety/cautions.ts";
import { applyMachineLimits } from "./machine-limits.ts";
import { forEachMetric, type Metric } from "./metrics.ts";
import { adviseNozzle } from "./nozzle-advice.ts";
import { peersEstimate } from "./peers-estimate.ts";
import { noEstimate, practiceEstimate } from "./practice-estimate.ts";
import type { EstimateContext, StartingRecipeInput } from "./starting-input.ts";
import { testPlanFor } from "./test-plan.ts";

type Estimate = (metric: Metric, context: EstimateContext) => StartingSetpoint | null;

/** Best basis first: the first that knows a setpoint gives it. */
const estimates: readonly Estimate[] = [peersEstimate, practiceEstimate];

/**
 * A starting recipe for a metal, fitted to one machine: for each setpoint a value with its range and what it stands on, or
 * the test that finds it; bent to the machine's limits, checked for heat, with its cautions and a test plan. A function of
 * the shop's own input and released figures alone.
 */
export function startingRecipe(input: StartingRecipeInput): StartingRecipe {
  const nozzle = adviseNozzle(input);
  const group = nozzle.nozzleMm === null ? null : findGroup(input, nozzle.nozzleMm);
  const open: EstimateContext = { ...input, nozzleMm: nozzle.nozzleMm, group, cutHeightMm: null };
  const context = { ...open, cutHeightMm: estimate("cutHeightMm", open).value };
  const whole = keepPierceAboveCut(forEachMetric((metric) => estimate(metric, context)));
  const { setpoints, limits } = applyMachineLimits(whole, input.machine, input.units);
  return {
    schemaVersion: 1,
    units: "Each field's name ends in its unit: A, bar gauge, mm/min, mm, s, V",
    material: input.material,
    thicknessMm: input.thicknessMm,
    gas: input.gas,
    edition: group?.figuresFrom ?? null,
    groupId: group ? peerGroupId(group.key) : null,
    nozzle,
    setpoints,
    limits,
    heatCheck: checkHeat(input, setpoints),
    cautions: cautionsFor({ ...input, currentA: setpoints.currentA.high }),
    testPlan: testPlanFor({ nozzleMm: nozzle.nozzleMm, setpoints }),
  };
}

function findGroup(
  { material, thicknessMm, gas, groups }: StartingRecipeInput,
  nozzleMm: number,
): ReleasedGroup | null {
  const id = peerGroupId(peerGroupOf({ material, thicknessMm, nozzleMm, gas }));
  return groups.find((group) => peerGroupId(group.key) === id) ?? null;
}

function estimate(metric: Metric, context: EstimateContext): StartingSetpoint {
  for (const estimateBy of estimates) {
    const found = estimateBy(metric, context);
    if (found !== null) return found;
  }
  return noEstimate(metric);
}

/** The two heights may come from different sources; a pierce below the cut height would drive the torch into the sheet. */
function keepPierceAboveCut(setpoints: StartingRecipe["setpoints"]): StartingRecipe["setpoints"] {
  const { cutHeightMm: cut, pierceHeightMm: pierce } = setpoints;
  if (cut.value === null || pierce.value === null || pierce.value >= cut.value) return setpoints;
  const raised: StartingSetpoint = {
    ...pierce,
    value: cut.value,
    low: cut.value,
    high: Math.max(cut.value, pierce.high ?? cut.value),
    steps: [...pierce.steps, { kind: "limit", text: "Raised to the cut height: it cannot lie below." }],
  };
  return { ...setpoints, pierceHeightMm: raised };
}

function checkHeat(
  { material, thicknessMm, gas }: StartingRecipeInput,
  setpoints: StartingRecipe["setpoints"],
): StartingHeatCheck | null {
  return heatCheck({
    material,
    thicknessMm,
    gas,
    feedMmMin: setpoints.feedMmMin.value,
    kerfWidthMm: setpoints.kerfWidthMm.value,
    currentA: setpoints.currentA.value,
    arcVoltageV: setpoints.arcVoltageV.value,
  });
}
