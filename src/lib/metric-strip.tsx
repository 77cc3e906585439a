import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { standingOf } from "#shared/peers/standing.ts";
import { standingSentence } from "#shared/peers/standing-sentence.ts";
import { type Metric, metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatQuantity, formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { TemperStrip } from "../ui/temper-strip.tsx";

/** Why a group or one of its metrics is not shown, in words. */
export const withheldWords = {
  quorum: "Not enough shops yet",
  "three-shop-step": "Held back: too few shops changed for new figures to be safe to show",
} as const;

export interface MetricStripProps {
  metric: Metric;
  figures: PeerGroupFigures | undefined;
  /** The own setpoint, stored unit. */
  own?: number | null | undefined;
  units: UnitSystem;
  size: "full" | "mini";
  hideSentence?: boolean;
}

/** A temper strip for one metric of a peer group, with the own setpoint on it and its sentence. */
export function MetricStrip({ metric, figures, own, units, size, hideSentence }: MetricStripProps) {
  const { quantity, logScale, label } = metricDefinitions[metric];
  const distribution = figures?.status === "released" ? figures.distributions[metric] : null;
  const tickText = (value: number) => formatQuantity(value, quantity, units).text;
  const withheld = figures?.status === "withheld" ? withheldWords[figures.reason] : withheldWords.quorum;
  const shared = { tickText, size, scale: logScale ? "log" : "linear", ...(hideSentence && { hideSentence }) } as const;

  if (!figures) return <TemperStrip {...shared} sentence="" withheld="No edition to compare with yet" />;
  if (!distribution) return <TemperStrip {...shared} sentence="" withheld={withheld} />;
  const hasOwn = own !== null && own !== undefined;
  const sentence = hasOwn
    ? standingSentence(metric, own, standingOf(metric, own, distribution), units)
    : `${label}: half of the peers lie below ${formatWithUnit(distribution.quantiles.p50, quantity, units)}.`;
  return (
    <TemperStrip
      {...shared}
      quantiles={distribution.quantiles}
      density={distribution.density}
      sentence={sentence}
      own={hasOwn ? { value: own, text: formatWithUnit(own, quantity, units) } : undefined}
    />
  );
}
