import { describe, expect, test } from "vitest";
import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import { StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import { bandIndexOf } from "#shared/peers/peer-group.ts";
import { metrics } from "#shared/recipes/metrics.ts";
import type { StartingRecipeInput } from "#shared/recipes/starting-input.ts";
import { startingRecipe } from "#shared/recipes/starting-recipe.ts";
import { makeDistribution, makeGroup, someKey } from "#tests/support/peer-factories.ts";

const groupOf3 = makeGroup(
  {
    currentA: makeDistribution(43, 45, 47, { shops: "10-19" }),
    pressureBar: makeDistribution(4.5, 4.7, 4.9, { shops: "10-19" }),
    feedMmMin: makeDistribution(2000, 2500, 3125, { shops: "10-19", spread: Math.log(3125 / 2000) / 1.349 }),
    arcVoltageV: makeDistribution(115, 118, 121),
    kerfWidthMm: makeDistribution(1.4, 1.5, 1.6, { spread: Math.log(1.6 / 1.4) / 1.349 }),
  },
  { shops: "10-19" },
);

const input: StartingRecipeInput = {
  material: "mild-steel",
  thicknessMm: 3,
  gas: "air",
  nozzleMm: null,
  machine: { powerSourceMaxCurrentA: 65, topFeedMmMin: 12_000, torchPressureBar: null },
  groups: [groupOf3],
  network: { exponents: [{ material: "mild-steel", metric: "feedMmMin", exponent: -1.2 }] },
  units: "metric",
};

const keyAt = (thicknessMm: number, nozzleMm: number) => ({
  ...someKey,
  bandIndex: bandIndexOf(thicknessMm),
  nozzleMm,
});
const current = (p50: number, key: ReleasedGroup["key"], shops: ReleasedGroup["shops"] = "5-9") =>
  makeGroup({ currentA: makeDistribution(p50 - 2, p50, p50 + 2) }, { key, shops });

describe("starting recipe", () => {
  test("is what the contract and its exported JSON promise", () => {
    const recipe = startingRecipe(input);
    expect(StartingRecipe.parse(JSON.parse(JSON.stringify(recipe)))).toEqual(recipe);
    expect(recipe).toMatchObject({ schemaVersion: 1, groupId: "mild-steel_t3.15_n0.8_air", edition: { number: 1 } });
  });

  test("every setpoint has a basis and a word on what it stands on", () => {
    const { setpoints } = startingRecipe(input);
    expect(metrics.map((metric) => `${metric} ${setpoints[metric].basis}`)).toEqual([
      "currentA peers",
      "pressureBar peers",
      "feedMmMin peers",
      "cutHeightMm practice",
      "pierceHeightMm practice",
      "pierceDelayS none",
      "arcVoltageV peers",
      "kerfWidthMm peers",
    ]);
    expect(metrics.every((metric) => setpoints[metric].evidence !== "" && setpoints[metric].steps.length > 0)).toBe(
      true,
    );
  });

  test("the peers' median is moved from the band to the exact thickness by the network's exponent", () => {
    const { feedMmMin } = startingRecipe(input).setpoints;
    expect(feedMmMin.value).toBe(2650); // 2500 · (3/3.15)^-1.2 = 2650.6, three figures
    expect(feedMmMin.steps.map((s) => s.kind)).toEqual(["figures", "thickness", "range"]);
    expect(startingRecipe({ ...input, network: null }).setpoints.feedMmMin.value).toBe(2500);
  });

  test("the range reaches further out than the middle half, by equal factors where the quartiles lie so", () => {
    const { value, low, high } = startingRecipe({ ...input, network: null }).setpoints.feedMmMin;
    expect(low!).toBeLessThan(2000);
    expect(high!).toBeGreaterThan(3125);
    expect(value! / low!).toBeCloseTo(high! / value!, 1);
  });

  test("the range of fewer shops is wider", () => {
    const few = startingRecipe({
      ...input,
      groups: [makeGroup({ currentA: makeDistribution(43, 45, 47, { shops: "5-9" }) })],
    });
    const many = startingRecipe({
      ...input,
      groups: [makeGroup({ currentA: makeDistribution(43, 45, 47, { shops: "50+" }) })],
    });
    expect(few.setpoints.currentA.high).toBeGreaterThan(many.setpoints.currentA.high!);
  });

  test("quartiles that rounding made equal still leave a range", () => {
    const same = makeGroup({ currentA: makeDistribution(45, 45, 45, { spread: 0.5 }) });
    const { low, high } = startingRecipe({ ...input, groups: [same] }).setpoints.currentA;
    expect([low, high]).toEqual([44.5, 45.5]); // half a step of 0.5 A, stretched 2.28 times: 0.57 A
  });

  test("without peers practice fills in what it knows and the rest is left to tests", () => {
    const { setpoints, edition, groupId } = startingRecipe({ ...input, groups: [], network: null, nozzleMm: 0.8 });
    expect(setpoints.currentA).toMatchObject({ value: 42.5, low: 40, high: 45, basis: "practice" });
    expect(setpoints.feedMmMin).toMatchObject({ value: null, basis: "none" });
    expect(setpoints.arcVoltageV).toMatchObject({ value: null, low: null, high: null, basis: "none" });
    expect(setpoints.arcVoltageV.steps[0]?.text).toContain("only observing");
    expect([edition, groupId]).toEqual([null, null]);
  });

  test("a group of another material, gas, band or nozzle lends nothing", () => {
    const others = [
      { ...groupOf3, key: { ...someKey, material: "aluminium" as const } },
      { ...groupOf3, key: { ...someKey, gas: "oxygen" as const } },
      { ...groupOf3, key: keyAt(8, 0.8) },
      { ...groupOf3, key: keyAt(3, 1) },
    ];
    const { setpoints } = startingRecipe({ ...input, nozzleMm: 0.8, groups: others });
    expect(metrics.every((metric) => setpoints[metric].basis !== "peers")).toBe(true);
  });

  test("a pierce height is never below the cut height, and says when it was raised", () => {
    const odd = makeGroup({
      cutHeightMm: makeDistribution(2.9, 3, 3.1),
      pierceHeightMm: makeDistribution(1.9, 2, 2.1),
    });
    const { pierceHeightMm } = startingRecipe({ ...input, groups: [odd] }).setpoints;
    expect(pierceHeightMm).toMatchObject({ value: 3, low: 3 });
    expect(pierceHeightMm.steps.at(-1)?.text).toContain("Raised to the cut height");
  });

  test("carries heat check, cautions and a test plan", () => {
    const recipe = startingRecipe(input);
    expect(recipe.heatCheck?.arcPowerW).toBe(45 * 118);
    expect(recipe.cautions[0]?.text).toContain("shade 8");
    expect(recipe.testPlan.length).toBeGreaterThan(5);
    expect(startingRecipe({ ...input, groups: [] }).heatCheck).toBeNull();
  });

  test("its words are in the member's units", () => {
    const steps = startingRecipe({ ...input, units: "inch" }).setpoints.feedMmMin.steps;
    expect(steps[1]?.text).toContain("0.118 in");
  });
});

describe("limits of the machine", () => {
  const machine = (limits: Partial<StartingRecipeInput["machine"]>) => ({ ...input.machine, ...limits });

  test("a weaker power source brings current and feed down together, and says so twice", () => {
    const { setpoints, limits } = startingRecipe({
      ...input,
      network: null,
      nozzleMm: 0.8,
      machine: machine({ powerSourceMaxCurrentA: 36 }),
    });
    expect(setpoints.currentA).toMatchObject({ value: 36, high: 36 });
    expect(setpoints.feedMmMin.value).toBe(2000); // 2500 · 36/45
    expect(limits.map((l) => [l.limit, l.metric, l.wanted, l.given])).toEqual([
      ["power-source-current", "currentA", 45, 36],
      ["power-source-current", "feedMmMin", 2500, 2000],
    ]);
  });

  test("the top feed holds the feed, the pressure at the torch the pressure", () => {
    const { setpoints, limits } = startingRecipe({
      ...input,
      machine: machine({ topFeedMmMin: 2000, torchPressureBar: 4.2 }),
    });
    expect(setpoints.feedMmMin).toMatchObject({ value: 2000, high: 2000 });
    expect(setpoints.pressureBar).toMatchObject({ value: 4.2, low: 4.2, high: 4.2 });
    expect(limits.map((l) => l.limit)).toEqual(["top-feed", "torch-pressure"]);
  });

  test("a limit inside the range ends the range and leaves the value", () => {
    const { setpoints, limits } = startingRecipe({ ...input, machine: machine({ powerSourceMaxCurrentA: 46 }) });
    expect(setpoints.currentA).toMatchObject({ value: 45, high: 46 });
    expect(setpoints.currentA.steps.at(-1)?.kind).toBe("limit");
    expect(limits).toEqual([]);
  });

  test("no value and no range ever passes a limit", () => {
    const { setpoints } = startingRecipe({
      ...input,
      machine: { powerSourceMaxCurrentA: 20, topFeedMmMin: 300, torchPressureBar: 3 },
    });
    expect(Math.max(setpoints.currentA.value!, setpoints.currentA.high!)).toBeLessThanOrEqual(20);
    expect(Math.max(setpoints.feedMmMin.value!, setpoints.feedMmMin.high!)).toBeLessThanOrEqual(300);
    expect(Math.max(setpoints.pressureBar.value!, setpoints.pressureBar.high!)).toBeLessThanOrEqual(3);
  });
});

describe("nozzle advice", () => {
  const adviseFor = (more: Partial<StartingRecipeInput>) => startingRecipe({ ...input, ...more }).nozzle;

  test("the shop's choice stands, with a word where practice differs", () => {
    expect(adviseFor({ nozzleMm: 1 })).toMatchObject({ nozzleMm: 1, chosenBy: "shop" });
    expect(adviseFor({ nozzleMm: 1 }).reason).toContain("0.6 mm");
    expect(adviseFor({ nozzleMm: 0.6 }).reason).not.toContain("Common practice");
  });

  test("most peers in the band decide", () => {
    const groups = [current(30, keyAt(3, 0.6)), current(45, keyAt(3, 0.8), "20-49"), current(55, keyAt(6, 1), "50+")];
    expect(adviseFor({ groups })).toMatchObject({ nozzleMm: 0.8, chosenBy: "peers" });
  });

  test("among nozzles with as many peers, the one common practice takes", () => {
    const groups = [current(45, keyAt(3, 0.8)), current(30, keyAt(3, 0.6))];
    expect(adviseFor({ groups }).nozzleMm).toBe(0.6);
  });

  test("peers the power source cannot follow are passed over", () => {
    const groups = [current(30, keyAt(3, 0.6)), current(45, keyAt(3, 0.8), "20-49")];
    const machine = { ...input.machine, powerSourceMaxCurrentA: 35 };
    expect(adviseFor({ groups, machine }).nozzleMm).toBe(0.6);
  });

  test("without peers practice decides, down to what the power source can feed", () => {
    const thick = { groups: [], thicknessMm: 12 };
    expect(adviseFor(thick)).toMatchObject({ nozzleMm: 1, chosenBy: "practice" });
    const small = adviseFor({ ...thick, machine: { ...input.machine, powerSourceMaxCurrentA: 45 } });
    expect(small).toMatchObject({ nozzleMm: 0.8, chosenBy: "practice" });
    expect(small.reason).toContain("gives 45 A");
  });

  test("for another gas without peers nobody advises, and nothing is made up", () => {
    const recipe = startingRecipe({ ...input, groups: [], gas: "nitrogen" });
    expect(recipe.nozzle).toMatchObject({ nozzleMm: null, chosenBy: "nobody" });
    expect(metrics.every((metric) => recipe.setpoints[metric].value === null)).toBe(true);
  });
});
