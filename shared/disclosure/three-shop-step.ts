import type { DisclosureParameters } from "./parameters.ts";

export type StepDecision = "release new" | "keep old figures" | "withhold";

export interface StepQuestion {
  /** Figures of this group were shown in some earlier edition: whoever kept them can subtract. */
  shownBefore: boolean;
  /** Distinct shops that came, left or changed what they give since those figures were computed. */
  changedShops: number;
  /** Those among them that took a contribution back. */
  withdrawnShops: number;
  /** Editions in a row that have kept figures with something withdrawn in them. */
  heldEditions: number;
}

/**
 * The three-shop step: may new figures take the place of old ones?
 * Two editions that differ by one shop give that shop away by subtraction (differencing, in the SDC Handbook's word), and
 * a coalition of two knows its own part. So figures move only when several shops moved; otherwise the old ones stay, and
 * where they still hold something withdrawn, they stay for a few editions at most and then go.
 */
export function threeShopStep(question: StepQuestion, parameters: DisclosureParameters): StepDecision {
  if (!question.shownBefore || question.changedShops >= parameters.changedShops) return "release new";
  if (question.withdrawnShops === 0) return "keep old figures";
  return question.heldEditions < parameters.heldEditions ? "keep old figures" : "withhold";
}
