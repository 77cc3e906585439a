import type { Recipe } from "#shared/contracts/recipes.ts";
import { type Metric, metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatQuantity } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { MetricStrip } from "../../lib/metric-strip.tsx";
import { peerSubjectOf } from "../../lib/recipe-words.ts";

export interface SetpointCellProps {
  recipe: Recipe;
  metric: Metric;
  units: UnitSystem;
}

/** One own value, and below it where it lies among its peers, where there are peers to show. */
export function SetpointCell({ recipe, metric, units }: SetpointCellProps) {
  const { content } = recipe.version;
  const value = content.setpoints[metric];
  if (value === null) return <span className="text-muted">–</span>;
  return (
    <span className="inline-flex flex-col items-end">
      <span className="font-bold">{formatQuantity(value, metricDefinitions[metric].quantity, units).text}</span>
      <PeersBelow recipe={recipe} metric={metric} units={units} />
    </span>
  );
}

/** The mini strip alone; nothing where the group is not shown. */
export function PeersBelow({ recipe, metric, units }: SetpointCellProps) {
  const { content } = recipe.version;
  const { figures } = useGroupFigures(peerSubjectOf(content));
  if (figures?.status !== "released" || figures.distributions[metric] === null) return null;
  return <MetricStrip metric={metric} figures={figures} own={content.setpoints[metric]} units={units} size="mini" />;
}
