/**
 * An invented peer group for the landing page, in the shape an edition releases one. No shop stands behind it.
 * The sentence is kept as text so that the page needs none of the statistics; a test holds it against them.
 */
export const exampleFigures = {
  quantiles: { p5: null, p10: 1850, p25: 2060, p50: 2310, p75: 2430, p90: 2560, p95: null },
  /** (2430 - 2060 on a log scale) / 1.349 */
  spread: 0.1225,
  ownMmMin: 2450,
  sentence: "Your 2,450 mm/min is quicker than most: about 78 % of peers cut slower.",
};
