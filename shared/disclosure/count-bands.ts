import type { CountBand } from "../contracts/released-figures.ts";
import { fewestShopsEver } from "./parameters.ts";

/** The bands rule: a count of shops or recipes leaves only as the band it lies in, so that one more is not seen. */
export function countBandOf(count: number): CountBand {
  if (!Number.isInteger(count) || count < fewestShopsEver) {
    throw new RangeError(`countBandOf needs a whole count of at least ${fewestShopsEver}`);
  }
  if (count >= 50) return "50+";
  if (count >= 20) return "20-49";
  if (count >= 10) return "10-19";
  return count >= 5 ? "5-9" : "3-4";
}
