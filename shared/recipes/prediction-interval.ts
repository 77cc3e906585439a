import type { CountBand } from "../contracts/released-figures.ts";

/** Upper quartile of the standard normal distribution. */
const normalQuartile = 0.6745;

/**
 * 0.9 quantile of Student's t with one degree of freedom less than the shops; NIST/SEMATECH e-Handbook 1.3.6.7.2 for 2, 6,
 * 13 and 31 of them to 3 decimals, and for 79 taken from its rows around it. The number of shops is never released, so
 * each band counts as the number near its geometric middle; the last one is open and counts as 80.
 */
const byShops: Record<CountBand, { shops: number; t90: number }> = {
  "3-4": { shops: 3, t90: 1.886 },
  "5-9": { shops: 7, t90: 1.44 },
  "10-19": { shops: 14, t90: 1.35 },
  "20-49": { shops: 32, t90: 1.309 },
  "50+": { shops: 80, t90: 1.292 },
};

/**
 * How many times further than its quartile an 80 % prediction interval reaches from the median: what one more shop would
 * set, from normal quartiles known from this many shops. t90 · sqrt(1 + 1/n) / 0.6745, which comes down to 1.9 in a large group.
 */
export function quartileStretch(shops: CountBand): number {
  const { shops: n, t90 } = byShops[shops];
  return (t90 * Math.sqrt(1 + 1 / n)) / normalQuartile;
}
