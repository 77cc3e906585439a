/**
 * Ranges of ISO 9013:2017 for the quality of a cut face. Each limit is c0 + c1 · a, a the cut thickness in mm.
 * The limits of ranges 1 to 4 were seen second-hand and agree with memory; range 5 of u is from memory, unverified. The
 * scope, plasma cuts of 0.5 to 150 mm, was seen in the standard's official abstract. That u leaves out a zone at both
 * edges, and that Rz5 is taken over 15 mm where the face is roughest, is from memory: whoever measures sees to it.
 */
const uLimitsMm = [
  { range: 1, c0: 0.05, c1: 0.003 },
  { range: 2, c0: 0.15, c1: 0.007 },
  { range: 3, c0: 0.4, c1: 0.01 },
  { range: 4, c0: 0.8, c1: 0.02 },
  { range: 5, c0: 1.2, c1: 0.035 },
] as const;

const rz5LimitsUm = [
  { range: 1, c0: 10, c1: 0.6 },
  { range: 2, c0: 40, c1: 0.8 },
  { range: 3, c0: 70, c1: 1.2 },
  { range: 4, c0: 110, c1: 1.8 },
] as const;

export type QualityRange = number | "outside";

interface Limit {
  range: number;
  c0: number;
  c1: number;
}

function rangeOf(limits: readonly Limit[], measured: number, thicknessMm: number): QualityRange | null {
  if (!(thicknessMm >= 0.5 && thicknessMm <= 150) || !(measured >= 0)) return null;
  // A hair of slack: 0.4 + 0.01 * 3 is not quite 0.43 in binary.
  return limits.find(({ c0, c1 }) => measured <= c0 + c1 * thicknessMm + 1e-9)?.range ?? "outside";
}

/**
 * Range of the perpendicularity or angularity tolerance u.
 * @param uMm  mm, >= 0
 * @param thicknessMm  mm
 * @returns 1 to 5, "outside" beyond range 5, null where the standard does not apply
 */
export function perpendicularityRange(uMm: number, thicknessMm: number): QualityRange | null {
  return rangeOf(uLimitsMm, uMm, thicknessMm);
}

/**
 * Range of the mean height of the profile Rz5.
 * @param rz5Um  µm, >= 0
 * @param thicknessMm  mm
 * @returns 1 to 4, "outside" beyond range 4, null where the standard does not apply
 */
export function roughnessRange(rz5Um: number, thicknessMm: number): QualityRange | null {
  return rangeOf(rz5LimitsUm, rz5Um, thicknessMm);
}
