import type { DisclosureParameters } from "./parameters.ts";

/** Shops, not recipes: a hundred recipes of one shop are still one shop. */
export function distinctShops(contributions: readonly { shop: number }[]): number {
  return new Set(contributions.map((c) => c.shop)).size;
}

/** The quorum rule: fewer shops than this, and nothing of the group or metric is shown, not even how many. */
export function meetsQuorum(
  contributions: readonly { shop: number }[],
  parameters: Pick<DisclosureParameters, "quorum">,
) {
  return distinctShops(contributions) >= parameters.quorum;
}
