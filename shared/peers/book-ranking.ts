import type { PeerGroupFigures } from "../contracts/released-figures.ts";
import type { Setpoints } from "../recipes/metrics.ts";
import { type Check, checkFirst, type MetricStanding, standingsOf } from "./advice.ts";
import { isUnusual } from "./standing.ts";

/** One of the shop's own recipes with what its peer group is known to do; null where no edition names the group. */
export interface BookEntry<Id> {
  id: Id;
  setpoints: Setpoints;
  figures: PeerGroupFigures | null;
  hasAcceptableTestCut: boolean;
}

export interface RankedEntry<Id> {
  id: Id;
  standings: MetricStanding[];
  checks: Check[];
}

export interface BookRanking<Id> {
  /** Most unusual first. */
  ranked: RankedEntry<Id>[];
  /** Recipes with no released figures to compare with. */
  withoutPeers: Id[];
}

/**
 * The shop's recipes by how unusual they are: first by how many setpoints are unusual, then by how far out the furthest
 * lies. Order of the input settles a tie.
 */
export function rankBook<Id>(entries: readonly BookEntry<Id>[]): BookRanking<Id> {
  const ranked: RankedEntry<Id>[] = [];
  const withoutPeers: Id[] = [];
  for (const { id, setpoints, figures, hasAcceptableTestCut } of entries) {
    const group = figures?.status === "released" ? figures : null;
    const standings = group ? standingsOf(setpoints, group) : [];
    if (group === null || standings.length === 0) withoutPeers.push(id);
    else ranked.push({ id, standings, checks: checkFirst(setpoints, group, hasAcceptableTestCut) });
  }
  ranked.sort((a, b) => unusualIn(b) - unusualIn(a) || furthestIn(b) - furthestIn(a));
  return { ranked, withoutPeers };
}

function unusualIn({ standings }: { standings: MetricStanding[] }): number {
  return standings.filter(({ standing }) => isUnusual(standing)).length;
}

function furthestIn({ standings }: { standings: MetricStanding[] }): number {
  return Math.abs(standings[0]?.standing.robustZ ?? 0);
}
