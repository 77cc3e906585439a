import type { CountBand } from "../contracts/released-figures.ts";

/** A band of shops or recipes in words: "20 to 49 shops", "50 or more shops". */
export function countWords(band: CountBand, what: "shops" | "recipes" = "shops"): string {
  return band === "50+" ? `50 or more ${what}` : `${band.replace("-", " to ")} ${what}`;
}
