import type { Contribution } from "../peers/contribution.ts";
import { compareMarks, type Digest, type FigureName, forEachFigure, type GroupMemory, ledgerOf } from "./ledger.ts";
import type { DisclosureParameters } from "./parameters.ts";
import { type StepDecision, threeShopStep } from "./three-shop-step.ts";

export interface FigureStep {
  decision: StepDecision;
  /** Something that stands behind the figure as last shown has been taken back. */
  withdrawn: boolean;
}

/** The three-shop step for each figure of a group, against what stood behind that figure when it was last computed. */
export function figureSteps(
  contributions: readonly Contribution[],
  previous: GroupMemory | null,
  parameters: DisclosureParameters,
  digest: Digest,
): Record<FigureName, FigureStep> {
  const now = ledgerOf(contributions, digest);
  return forEachFigure((name) => {
    const before = previous?.ledger[name] ?? {};
    const { changed, withdrawn } = compareMarks(before, now[name]);
    const decision = threeShopStep(
      {
        shownBefore: Object.keys(before).length > 0,
        changedShops: changed.size,
        withdrawnShops: withdrawn.size,
        heldEditions: previous?.held[name] ?? 0,
      },
      parameters,
    );
    return { decision, withdrawn: withdrawn.size > 0 };
  });
}
