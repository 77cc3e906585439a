import type { NetworkFigures, ReleasedDistribution } from "../contracts/released-figures.ts";
import type { EstimateStep, StartingSetpoint } from "../contracts/starting-recipe-figures.ts";
import { roundForRelease, roundingStep } from "../disclosure/rounding.ts";
import type { Material } from "../materials/materials.ts";
import { countWords } from "../peers/count-words.ts";
import { bandLabel, bandNominalMm } from "../peers/peer-group.ts";
import { fromScale, toScale } from "../peers/scale.ts";
import { formatDate } from "../units/dates.ts";
import { formatWithUnit } from "../units/format.ts";
import { type Metric, metricDefinitions } from "./metrics.ts";
import { quartileStretch } from "./prediction-interval.ts";
import type { EstimateContext } from "./starting-input.ts";

/**
 * A setpoint from the peer group itself: its median, moved from the band's nominal thickness to the exact one by the
 * network's exponent where it has one, with an 80 % prediction interval from the quartiles. Null where the group shows
 * no figures for the metric.
 */
export function peersEstimate(metric: Metric, context: EstimateContext): StartingSetpoint | null {
  const distribution = context.group?.distributions[metric];
  if (!context.group || !distribution) return null;
  const { shops, figuresFrom } = distribution;
  const band = context.group.key.bandIndex;
  const exponent = exponentOf(metric, context.material, context.network);
  const factor = exponent === null ? 1 : (context.thicknessMm / bandNominalMm(band)) ** exponent;
  const reach = predictionInterval(metric, distribution);
  const moved = (value: number) => withinHard(metric, roundForRelease(metric, value * factor));

  const steps: EstimateStep[] = [
    {
      kind: "figures",
      text: `Median of ${countWords(shops)} in the ${bandLabel(band)}, edition ${figuresFrom.number} of ${formatDate(figuresFrom.date)}.`,
    },
  ];
  if (exponent !== null && factor !== 1) {
    const shown = (mm: number) => formatWithUnit(mm, "thickness", context.units);
    const text = `Moved from ${shown(bandNominalMm(band))} to ${shown(context.thicknessMm)}: thickness to the power ${exponent}, as fitted over the network.`;
    steps.push({ kind: "thickness", text });
  }
  steps.push({
    kind: "range",
    text: "The middle half of peers, widened so that 8 in 10 further shops would set a value inside.",
  });
  return {
    value: moved(distribution.quantiles.p50),
    low: moved(reach.low),
    high: moved(reach.high),
    basis: "peers",
    evidence: `${countWords(shops)}, edition ${figuresFrom.number}`,
    steps,
  };
}

function exponentOf(metric: Metric, material: Material, network: NetworkFigures | null): number | null {
  return network?.exponents.find((e) => e.metric === metric && e.material === material)?.exponent ?? null;
}

/**
 * 80 % prediction interval on the metric's own scale. Each side keeps the distance of its own quartile, as settings lean
 * to one side; never under half a rounding step, as rounded quartiles may fall together.
 */
function predictionInterval(metric: Metric, { quantiles, shops }: ReleasedDistribution): { low: number; high: number } {
  const [p25, p50, p75] = [quantiles.p25, quantiles.p50, quantiles.p75].map((value) => toScale(metric, value));
  const step = toScale(metric, quantiles.p50 + roundingStep(metric, quantiles.p50)) - p50!;
  const stretch = quartileStretch(shops);
  return {
    low: fromScale(metric, p50! - stretch * Math.max(p50! - p25!, step / 2)),
    high: fromScale(metric, p50! + stretch * Math.max(p75! - p50!, step / 2)),
  };
}

function withinHard(metric: Metric, value: number): number {
  const { min, max } = metricDefinitions[metric].hard;
  return Math.min(max, Math.max(min, value));
}
