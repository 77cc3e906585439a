import { requireThat } from "./require-that.ts";

/** Refuses an empty sample and NaN or infinite values, which would pass through comparisons unseen. `who` names the function. */
export function requireSample(values: ArrayLike<number>, who: string, least = 1): void {
  requireThat(values.length >= least, `${who} needs at least ${least === 1 ? "one value" : `${least} values`}`);
  for (let i = 0; i < values.length; i++) {
    requireThat(Number.isFinite(values[i]), `${who} needs finite numbers`);
  }
}
