import { metricDefinitions, type Range, thicknessRangeMm } from "../recipes/metrics.ts";
import { mmPerInch } from "../units/units.ts";

const secondsPerMinute = 60;

interface Suspect {
  thicknessMm: number;
  feedMmMin: number;
  ratio: number;
}

interface Slip {
  /** What was meant, as a multiple of what is on record. */
  factor: number;
  figure: "feedMmMin" | "thicknessMm";
  words: string;
}

/** Kerf widths are not here: one typed in the wrong unit falls outside what a kerf can be. */
const slips: readonly Slip[] = [
  { factor: secondsPerMinute, figure: "feedMmMin", words: "Was the feed meant in mm/s?" },
  { factor: mmPerInch, figure: "feedMmMin", words: "Was the feed meant in in/min?" },
  { factor: mmPerInch, figure: "thicknessMm", words: "Was the thickness meant in inches?" },
  { factor: 1 / mmPerInch, figure: "feedMmMin", words: "Was the feed meant in mm/min, not in/min?" },
  { factor: 1 / mmPerInch, figure: "thicknessMm", words: "Was the thickness meant in mm, not inches?" },
  { factor: 1 / 10, figure: "feedMmMin", words: "Has the feed a digit too many?" },
];

const possible: Record<Slip["figure"], Range> = {
  feedMmMin: metricDefinitions.feedMmMin.soft,
  thicknessMm: thicknessRangeMm,
};

/** The slips that would explain an odd heat check: undone, each gives a possible figure and a plausible ratio. */
export function likelySlips(suspect: Suspect, plausible: Range): string[] {
  return slips
    .filter(({ factor, figure }) => {
      const meant = suspect[figure] * factor;
      const ratio = suspect.ratio * factor;
      const { min, max } = possible[figure];
      return meant >= min && meant <= max && ratio >= plausible.min && ratio <= plausible.max;
    })
    .map(({ words }) => words);
}
