import type { ReleasedGroup } from "../contracts/released-figures.ts";
import type { Contribution } from "../peers/contribution.ts";
import { metrics } from "../recipes/metrics.ts";

/**
 * Everything of a group that is released by itself, and can therefore be subtracted by itself: each metric, the share of
 * acceptable cuts, and the counts of the group, which stand for all that a contribution holds.
 */
const figureNames = [...metrics, "acceptable", "whole"] as const;
export type FigureName = (typeof figureNames)[number];

/** Shop → machine → digest of what it gave. */
export type Marks = Record<string, Record<string, string>>;
export type Ledger = Record<FigureName, Marks>;

/** Turns what a machine gave into a mark. A keyed hash keeps withdrawn values from being read back off the marks. */
export type Digest = (text: string) => string;

/** Marks that are the text itself: for building in memory. A server that stores marks passes a keyed hash. */
export const plainDigest: Digest = (text) => text;

/**
 * What the next edition must know of a group: the figures last shown, who stood behind each of them, and for how many
 * editions each has held something withdrawn. Plain data for the edition builder alone; it never leaves the server.
 */
export interface GroupMemory {
  figures: ReleasedGroup;
  ledger: Ledger;
  held: Record<FigureName, number>;
}

export interface Changes {
  changed: Set<string>;
  withdrawn: Set<string>;
}

export function forEachFigure<Value>(make: (name: FigureName) => Value): Record<FigureName, Value> {
  return Object.fromEntries(figureNames.map((name) => [name, make(name)])) as Record<FigureName, Value>;
}

export function ledgerOf(contributions: readonly Contribution[], digest: Digest): Ledger {
  return forEachFigure((name) => {
    const marks: Marks = {};
    for (const contribution of contributions) {
      const given = whatItGives(name, contribution);
      if (given === null) continue;
      const { shop, machine } = contribution;
      const machines = marks[shop] ?? {};
      marks[shop] = { ...machines, [machine]: digest(`${shop}/${machine}/${name}/${given}`) };
    }
    return marks;
  });
}

function whatItGives(name: FigureName, contribution: Contribution): string | null {
  const { setpoints, acceptedCuts, testCuts } = contribution;
  if (name === "whole") return `${metrics.map((metric) => setpoints[metric]).join(" ")} ${acceptedCuts} of ${testCuts}`;
  if (name === "acceptable") return testCuts === 0 ? null : `${acceptedCuts} of ${testCuts}`;
  return setpoints[name]?.toString() ?? null;
}

/** Which shops changed between two sets of marks, and which of them took something back. */
export function compareMarks(before: Marks, now: Marks): Changes {
  const changed = new Set<string>();
  const withdrawn = new Set<string>();
  for (const shop of new Set([...Object.keys(before), ...Object.keys(now)])) {
    const [old, fresh] = [before[shop] ?? {}, now[shop] ?? {}];
    const machines = new Set([...Object.keys(old), ...Object.keys(fresh)]);
    if ([...machines].some((machine) => old[machine] !== fresh[machine])) changed.add(shop);
    if (Object.keys(old).some((machine) => fresh[machine] === undefined)) withdrawn.add(shop);
  }
  return { changed, withdrawn };
}
