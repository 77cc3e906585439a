import type { PeerGroupFigures, ReleasedGroup } from "../contracts/released-figures.ts";
import type { Contribution } from "../peers/contribution.ts";
import { forEachMetric } from "../recipes/metrics.ts";
import { figureSteps } from "./figure-steps.ts";
import { type Digest, type FigureName, forEachFigure, type GroupMemory, ledgerOf, plainDigest } from "./ledger.ts";
import type { DisclosureParameters } from "./parameters.ts";

/**
 * What to keep beside an edition once it is published, so that the next one can apply the three-shop step; null while
 * nothing of the group was ever shown. Takes the same inputs as `releaseGroup`, and the figures it returned.
 */
export function rememberRelease(
  contributions: readonly Contribution[],
  previous: GroupMemory | null,
  parameters: DisclosureParameters,
  figures: PeerGroupFigures,
  digest: Digest = plainDigest,
): GroupMemory | null {
  if (figures.status === "withheld" && previous === null) return null;
  const steps = figureSteps(contributions, previous, parameters, digest);
  const now = ledgerOf(contributions, digest);
  const isFresh = (name: FigureName): boolean => {
    if (figures.status === "withheld" || steps[name].decision !== "release new") return false;
    if (name === "whole") return true;
    return (name === "acceptable" ? figures.acceptableShare : figures.distributions[name]) !== null;
  };
  return {
    figures: lastShown(figures, previous),
    ledger: forEachFigure((name) => (isFresh(name) ? now[name] : (previous?.ledger[name] ?? {}))),
    held: forEachFigure((name) => (isFresh(name) || !steps[name].withdrawn ? 0 : (previous?.held[name] ?? 0) + 1)),
  };
}

/** A metric that is not shown now keeps the figures it last had: members who kept them can still subtract. */
function lastShown(figures: PeerGroupFigures, previous: GroupMemory | null): ReleasedGroup {
  if (figures.status === "withheld") return previous!.figures; // remembered only where something was shown
  return {
    ...figures,
    acceptableShare: figures.acceptableShare ?? previous?.figures.acceptableShare ?? null,
    distributions: forEachMetric(
      (metric) => figures.distributions[metric] ?? previous?.figures.distributions[metric] ?? null,
    ),
  };
}
