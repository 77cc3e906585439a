import { useSuspenseQuery } from "@tanstack/react-query";
import type { RankedRecipe } from "#shared/contracts/peers.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { MetricStrip } from "../../lib/metric-strip.tsx";
import { peerSubjectOf, recipeName, recipeStateLabels } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { type Column, Table } from "../../ui/table.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { bookRankingQuery } from "./peers.queries.ts";

/** Own recipes ranked by how unusual they are. `most` cuts the list short and says how to see the rest. */
export function BookAgainstPeers({ most }: { most?: number }) {
  const { ranked, withoutPeers } = useSuspenseQuery(bookRankingQuery).data;
  if (ranked.length === 0) return <NothingRanked withoutPeers={withoutPeers} />;
  const shown = ranked.slice(0, most);
  return (
    <>
      <p className="mt-1 mb-4 max-w-text text-soft">
        Most unusual first. Unusual is not wrong: it is where to look when a cut is not as it should be.
        {withoutPeers > 0 ? ` ${withoutWords(withoutPeers)}` : null}
      </p>
      <Table
        caption="Own recipes, most unusual first"
        columns={columns}
        rows={shown}
        rowKey={({ recipe }) => recipe.id}
        renderCard={(row) => <Card row={row} />}
      />
      {shown.length < ranked.length ? (
        <ButtonLink to="/peers/book" className="mt-4">
          See all {ranked.length} recipes
        </ButtonLink>
      ) : null}
    </>
  );
}

function withoutWords(count: number): string {
  return count === 1
    ? "One recipe is not here: its group has too few shops."
    : `${count} recipes are not here: their groups have too few shops.`;
}

const columns: Column<RankedRecipe>[] = [
  { key: "recipe", header: "Recipe", rowHeader: true, cell: (row) => <Name row={row} /> },
  { key: "furthest", header: "Furthest out", cell: (row) => <Furthest row={row} /> },
  { key: "strip", header: "Among peers", cell: (row) => <Strip row={row} /> },
  { key: "check", header: "What to check first", cell: (row) => <p className="max-w-text text-sm">{advice(row)}</p> },
  { key: "group", header: "Peer group", cell: (row) => <GroupLink row={row} /> },
];

function Card({ row }: { row: RankedRecipe }) {
  return (
    <div className="space-y-2">
      <div className="font-bold">
        <Name row={row} />
      </div>
      <div className="flex items-center justify-between gap-4">
        <Furthest row={row} />
        <Strip row={row} />
      </div>
      <p className="text-sm">{advice(row)}</p>
      <GroupLink row={row} />
    </div>
  );
}

const advice = ({ checkFirst }: RankedRecipe) => checkFirst || "Nothing stands out.";

function Name({ row: { recipe } }: { row: RankedRecipe }) {
  const { units } = useSession();
  return (
    <>
      <TextLink to={`/recipes/${recipe.id}`}>{recipeName(recipe.version.content, units)}</TextLink>
      <p className="text-sm font-normal text-muted">
        {recipe.machineName} · {recipeStateLabels[recipe.state]}
      </p>
    </>
  );
}

function Furthest({ row: { standings } }: { row: RankedRecipe }) {
  const { units } = useSession();
  const [first] = standings;
  if (!first) return null;
  const { label, quantity } = metricDefinitions[first.metric];
  return (
    <div>
      <p className="figures">
        {label} {formatWithUnit(first.value, quantity, units)}
      </p>
      <p className="text-sm text-muted">{first.word}</p>
    </div>
  );
}

function Strip({ row: { recipe, standings } }: { row: RankedRecipe }) {
  const { units } = useSession();
  const { figures } = useGroupFigures(peerSubjectOf(recipe.version.content));
  const [first] = standings;
  if (!first || !figures) return null;
  return <MetricStrip metric={first.metric} figures={figures} own={first.value} units={units} size="mini" />;
}

function GroupLink({ row: { groupId, recipe } }: { row: RankedRecipe }) {
  const { units } = useSession();
  const name = recipeName(recipe.version.content, units);
  return (
    <TextLink to={`/peers/${groupId}?recipe=${recipe.id}`} aria-label={`Peers of ${name}`}>
      Peers
    </TextLink>
  );
}

function NothingRanked({ withoutPeers }: { withoutPeers: number }) {
  if (withoutPeers > 0) {
    return (
      <p className="mt-1 max-w-text text-soft">
        None of your recipes has peers with figures yet. {withoutWords(withoutPeers)}
      </p>
    );
  }
  const action = (
    <ButtonLink to="/recipes/new" kind="primary">
      Add a recipe
    </ButtonLink>
  );
  return (
    <div className="mt-4">
      <EmptyState title="No recipe to compare yet" action={action}>
        Put what you cut with today into the book. Each setpoint then shows where it lies among peers.
      </EmptyState>
    </div>
  );
}
