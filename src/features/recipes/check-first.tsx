import type { Recipe } from "#shared/contracts/recipes.ts";
import { type Check, checkFirst } from "#shared/peers/advice.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { withheldWords } from "../../lib/metric-strip.tsx";
import { peerSubjectOf } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";

/** What stands out and what to look at, the furthest out first. */
export function CheckFirst({ recipe }: { recipe: Recipe }) {
  const { units } = useSession();
  const { content, proven } = recipe.version;
  const { figures } = useGroupFigures(peerSubjectOf(content));
  return (
    <section className="rounded border border-line bg-surface p-4">
      <h2 className="mb-1 font-bold">What to check first</h2>
      {!figures ? <p className="text-sm">No edition to compare with yet.</p> : null}
      {figures?.status === "withheld" ? (
        <p className="text-sm">{withheldWords[figures.reason]}. Nothing to compare these numbers with.</p>
      ) : null}
      {figures?.status === "released" ? (
        <Checks checks={checkFirst(content.setpoints, figures, proven)} units={units} />
      ) : null}
    </section>
  );
}

function Checks({ checks, units }: { checks: readonly Check[]; units: UnitSystem }) {
  if (checks.length === 0) return <p className="text-sm">Nothing stands out: no number is far from its peers.</p>;
  return (
    <ul className="space-y-3 text-sm">
      {checks.map(({ metric, value, standing, usually, verdict }) => {
        const { label, quantity } = metricDefinitions[metric];
        return (
          <li key={metric}>
            <p>
              <b>{label}</b> of <span className="figures">{formatWithUnit(value, quantity, units)}</span> is{" "}
              {standing.word}. It usually goes with {usually}.
            </p>
            <p className="font-bold">{verdict}</p>
          </li>
        );
      })}
    </ul>
  );
}
