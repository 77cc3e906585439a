import type { Contribution } from "../peers/contribution.ts";
import type { DisclosureParameters } from "./parameters.ts";
import { meetsQuorum } from "./quorum.ts";

/**
 * Share of test cuts found acceptable, to 5 %, each shop counting alike; null under the quorum of shops with test cuts.
 * Never 0 or 100 %: either would say the same of every shop in the group.
 */
export function acceptableShare(
  contributions: readonly Contribution[],
  parameters: DisclosureParameters,
): number | null {
  const tried = contributions.filter((c) => c.testCuts > 0);
  if (!meetsQuorum(tried, parameters)) return null;
  const shops = new Map<number, { accepted: number; all: number }>();
  for (const { shop, acceptedCuts, testCuts } of tried) {
    const sum = shops.get(shop) ?? { accepted: 0, all: 0 };
    shops.set(shop, { accepted: sum.accepted + acceptedCuts, all: sum.all + testCuts });
  }
  const shares = [...shops.values()].map(({ accepted, all }) => accepted / all);
  const mean = shares.reduce((sum, share) => sum + share, 0) / shares.length;
  return Math.min(0.95, Math.max(0.05, Math.round(mean * 20) / 20));
}
