import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import { countWords } from "#shared/peers/count-words.ts";
import { type Standing, standingOf } from "#shared/peers/standing.ts";
import { type Metric, metricDefinitions, metrics, type Setpoints } from "#shared/recipes/metrics.ts";
import { formatQuantity, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { MetricStrip } from "../../lib/metric-strip.tsx";
import { StripRow } from "../../ui/strip-row.tsx";

export interface MetricRowsProps {
  group: ReleasedGroup;
  /** The own recipe's, for the marks. */
  own: Setpoints | null;
  units: UnitSystem;
}

/** A strip for every metric, in the order a recipe lists them. */
export function MetricRows({ group, own, units }: MetricRowsProps) {
  return (
    <div>
      {metrics.map((metric) => (
        <Row key={metric} metric={metric} group={group} own={own?.[metric] ?? null} units={units} />
      ))}
    </div>
  );
}

interface RowProps {
  metric: Metric;
  group: ReleasedGroup;
  own: number | null;
  units: UnitSystem;
}

function Row({ metric, group, own, units }: RowProps) {
  const { label, quantity } = metricDefinitions[metric];
  const distribution = group.distributions[metric];
  const fewer = distribution && distribution.shops !== group.shops ? countWords(distribution.shops) : null;
  return (
    <StripRow
      name={label}
      unit={unitLabel(quantity, units)}
      figure={own === null ? undefined : formatQuantity(own, quantity, units).text}
      note={noteOn(metric, own, group)}
    >
      <MetricStrip metric={metric} figures={group} own={own} units={units} size="full" />
      {fewer ? <p className="text-sm text-muted">Filled in by {fewer}</p> : null}
    </StripRow>
  );
}

function noteOn(metric: Metric, own: number | null, group: ReleasedGroup): string {
  const distribution = group.distributions[metric];
  if (!distribution) return "not enough shops yet";
  if (own === null) return "not in your recipe";
  const standing = standingOf(metric, own, distribution);
  return standing.word === "typical" ? "typical" : `${standing.word}: ${placeOf(standing)}`;
}

function placeOf({ percentile, position, edge }: Standing): string {
  return percentile === null ? `${position} ${edge}` : `about ${percentile} %`;
}
