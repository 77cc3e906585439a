import type { Metric } from "../recipes/metrics.ts";
import type { Contribution } from "./contribution.ts";

/** One contribution's value of a metric with the weight it counts by. */
export interface WeightedValue {
  shop: number;
  value: number;
  weight: number;
}

/**
 * The values of a metric, each weighing 1 over the number its shop brings: every shop weighs 1 however many machines or
 * recipes it has. Contributions that leave the metric empty do not count, so a shop's weight never falls below 1.
 */
export function shopWeightedValues(metric: Metric, contributions: readonly Contribution[]): WeightedValue[] {
  const given = contributions.flatMap(({ shop, setpoints }) => {
    const value = setpoints[metric];
    return value === null ? [] : [{ shop, value }];
  });
  const perShop = new Map<number, number>();
  for (const { shop } of given) perShop.set(shop, (perShop.get(shop) ?? 0) + 1);
  return given.map(({ shop, value }) => ({ shop, value, weight: 1 / perShop.get(shop)! }));
}
