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
            note={noteOn(metric, value, figures)}
          >
            <MetricStrip
              {...{ metric, figures, units }}
              own={value}
              size="full"
              hideSentence={figures?.status !== "released" || figures.distributions[metric] === null}
            />
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

/** Where the value stands, or why that is not said. */
function noteOn(metric: Metric, value: number | null, figures: PeerGroupFigures | undefined): string {
  if (!figures) return "no edition yet";
  if (figures.status === "withheld") return figures.reason === "quorum" ? "not enough shops yet" : "held back for now";
  const distribution = figures.distributions[metric];
  if (distribution === null) return "not enough shops yet";
  return value === null ? "not set" : standingOf(metric, value, distribution).word;
}
