import type { Recipe } from "#shared/contracts/recipes.ts";
import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { standingOf } from "#shared/peers/standing.ts";
import { type Metric, metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatQuantity, unitLabel } from "#shared/units/format.ts";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { MetricStrip } from "../../lib/metric-strip.tsx";
import { peerSubjectOf } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { StripRow } from "../../ui/strip-row.tsx";
import { TextLink } from "../../ui/text-link.tsx";

/** The numbers, large, each with where it lies among the peers. */
export function SetpointStrips({ recipe }: { recipe: Recipe }) {
  const { units } = useSession();
  const { content } = recipe.version;
  const { figures, groupId } = useGroupFigures(peerSubjectOf(content));
  return (
    <section aria-label="Setpoints">
      {metrics.map((metric) => {
        const { label, quantity } = metricDefinitions[metric];
        const value = content.setpoints[metric];
        return (
          <StripRow
            key={metric}
            name={label}
            unit={unitLabel(quantity, units)}
            figure={value === null ? undefined : formatQuantity(value, quantity, units).text}
            note={value === null ? "not set" : standingNote(metric, value, figures)}
          >
            <MetricStrip metric={metric} figures={figures} own={value} units={units} size="full" />
          </StripRow>
        );
      })}
      {figures?.status === "released" ? (
        <p className="mt-2 text-sm">
          <TextLink to={`/peers/${groupId}`}>Open the peer group</TextLink>
        </p>
      ) : null}
    </section>
  );
}

function standingNote(metric: Metric, value: number, figures: PeerGroupFigures | undefined): string | undefined {
  if (figures?.status !== "released") return undefined;
  const distribution = figures.distributions[metric];
  return distribution === null ? "not enough shops yet" : standingOf(metric, value, distribution).word;
}
