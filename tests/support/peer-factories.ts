import type { ReleasedDistribution, ReleasedGroup } from "#shared/contracts/released-figures.ts";
import type { Contribution } from "#shared/peers/contribution.ts";
import { type PeerGroupKey, peerGroupOf } from "#shared/peers/peer-group.ts";
import { type Metric, metrics, type Setpoints } from "#shared/recipes/metrics.ts";

export const edition1 = { number: 1, date: "2026-01-01" };
export const edition2 = { number: 2, date: "2026-04-01" };
export const edition3 = { number: 3, date: "2026-07-01" };
export const edition4 = { number: 4, date: "2026-10-01" };
export const edition5 = { number: 5, date: "2027-01-01" };

export const someKey: PeerGroupKey = peerGroupOf({ material: "mild-steel", thicknessMm: 3, nozzleMm: 0.8, gas: "air" });

export function makeSetpoints(values: Partial<Setpoints> = {}): Setpoints {
  return { ...(Object.fromEntries(metrics.map((metric) => [metric, null])) as Setpoints), ...values };
}

export function makeContribution(
  shop: number,
  values: Partial<Setpoints> = {},
  more: Partial<Contribution> = {},
): Contribution {
  return {
    shop,
    machine: shop * 100,
    key: someKey,
    thicknessMm: 3,
    setpoints: makeSetpoints(values),
    acceptedCuts: 1,
    testCuts: 1,
    ...more,
  };
}

/** One contribution a shop, shops numbered from 1. */
export function makeShops(metric: Metric, values: readonly number[]): Contribution[] {
  return values.map((value, i) => makeContribution(i + 1, { [metric]: value }));
}

export function makeDistribution(
  p25: number,
  p50: number,
  p75: number,
  more: Partial<ReleasedDistribution> = {},
): ReleasedDistribution {
  return {
    shops: "5-9",
    quantiles: { p5: null, p10: null, p25, p50, p75, p90: null, p95: null },
    spread: (p75 - p25) / 1.349,
    density: null,
    figuresFrom: edition1,
    ...more,
  };
}

export function makeGroup(
  distributions: Partial<ReleasedGroup["distributions"]>,
  more: Partial<ReleasedGroup> = {},
): ReleasedGroup {
  const none = Object.fromEntries(metrics.map((metric) => [metric, null])) as ReleasedGroup["distributions"];
  return {
    status: "released",
    key: someKey,
    shops: "5-9",
    recipes: "5-9",
    figuresFrom: edition1,
    distributions: { ...none, ...distributions },
    acceptableShare: null,
    ...more,
  };
}
