import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { standingOf } from "#shared/peers/standing.ts";
import type { RecipeFigures } from "#shared/recipes/limits.ts";
import { type Metric, metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { MetricStrip, withheldWords } from "../../lib/metric-strip.tsx";

interface LiveProps {
  figures: PeerGroupFigures | undefined;
  own: RecipeFigures;
  units: UnitSystem;
}

/** Beside the form: where every setpoint typed so far lies. */
export function LiveStandings({ figures, own, units }: LiveProps) {
  if (own.thicknessMm == null || own.nozzleMm == null) {
    return <p className="text-sm text-muted">Give metal, thickness and nozzle, and your peers' figures appear here.</p>;
  }
  if (!figures) return <p className="text-sm text-muted">No edition to compare with yet.</p>;
  if (figures.status === "withheld") {
    return (
      <p className="text-sm text-muted">Peers of this metal, thickness and nozzle: {withheldWords[figures.reason]}.</p>
    );
  }
  return (
    <div className="divide-y divide-line">
      {metrics.map((metric) => (
        <LiveStanding key={metric} metric={metric} figures={figures} own={own} units={units} heading />
      ))}
    </div>
  );
}

/** One setpoint's strip; nothing where the group has no figures for it. */
export function LiveStanding({
  metric,
  figures,
  own,
  units,
  heading,
}: LiveProps & { metric: Metric; heading?: boolean }) {
  const distribution = figures?.status === "released" ? figures.distributions[metric] : null;
  if (!distribution) return null;
  const value = own[metric];
  const { label, quantity } = metricDefinitions[metric];
  return (
    <div className="py-2">
      {heading ? (
        <p className="mb-1 flex justify-between gap-2 text-sm">
          <b>{label}</b>
          <span className="text-soft">
            {value == null
              ? "not set"
              : `${formatWithUnit(value, quantity, units)}: ${standingOf(metric, value, distribution).word}`}
          </span>
        </p>
      ) : null}
      <MetricStrip metric={metric} figures={figures} own={value} units={units} size="full" hideSentence={!!heading} />
    </div>
  );
}
