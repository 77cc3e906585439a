import type { WeightedValue } from "./shop-weights.ts";

/** Interquartile ranges beyond a quartile from where on a value is far out (Tukey 1977, Exploratory Data Analysis, 2D). */
const farOut = 3;

/** Smallest value with at least the share p of the weight at or below it; `sorted` ascending by value. */
function quartile(sorted: readonly WeightedValue[], p: number): number {
  const total = sorted.reduce((sum, v) => sum + v.weight, 0);
  let upTo = 0;
  for (const { value, weight } of sorted) {
    upTo += weight;
    if (upTo >= p * total * (1 - 1e-9)) return value; // weights like 1/3 do not add up to whole shops exactly
  }
  return sorted.at(-1)!.value;
}

function widestShop(values: readonly WeightedValue[], side: 1 | -1): { shop: number; othersReach: number } {
  const reach = new Map<number, number>();
  for (const { shop, value } of values) reach.set(shop, Math.max(reach.get(shop) ?? -Infinity, side * value));
  const [first, second] = [...reach].sort((a, b) => b[1] - a[1]);
  return { shop: first![0], othersReach: second?.[1] ?? first![1] };
}

/**
 * Draws one shop's far-out values in: on each side, what the outermost shop holds beyond both Tukey's outer fence and the
 * reach of every other shop moves to the further of the two. The Harrell-Davis estimator gives each value some weight,
 * so without this one slip of the keyboard in a group of five would carry the median away; a tail that two shops share is
 * left alone. From four shops on the fence itself does not depend on how far out the lone value lies.
 * @param values  in the scale they are summarised on, any order, not empty
 */
export function drawInLoneExtremes(values: readonly WeightedValue[]): WeightedValue[] {
  const sorted = [...values].sort((a, b) => a.value - b.value);
  const lower = quartile(sorted, 0.25);
  const upper = quartile(sorted, 0.75);
  const fence = farOut * (upper - lower);
  const top = widestShop(sorted, 1);
  const bottom = widestShop(sorted, -1);
  const ceiling = Math.max(upper + fence, top.othersReach);
  const floor = Math.min(lower - fence, -bottom.othersReach);
  return values.map((v) => {
    if (v.shop === top.shop && v.value > ceiling) return { ...v, value: ceiling };
    if (v.shop === bottom.shop && v.value < floor) return { ...v, value: floor };
    return v;
  });
}
