import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import type { PublishedEdition } from "#shared/contracts/editions.ts";
import type { Recipe } from "#shared/contracts/recipes.ts";
import type { ListedRecipe, PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { countWords } from "#shared/peers/count-words.ts";
import { parsePeerGroupId } from "#shared/peers/peer-group.ts";
import { formatDate } from "#shared/units/dates.ts";
import { currentEditionQuery, editionGroupQuery } from "../../lib/edition-queries.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { NotFoundPage } from "../../shell/problem-page.tsx";
import { useSession } from "../../shell/session.queries.ts";
import { PageHeader } from "../../ui/page-header.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { GroupAside } from "./group-aside.tsx";
import { HeldNote } from "./held-note.tsx";
import { ListedRecipes } from "./listed-recipes.tsx";
import { MetricRows } from "./metric-rows.tsx";
import { NoEditionYet } from "./no-edition-yet.tsx";
import { OwnRecipeChoice } from "./own-recipe-choice.tsx";
import { bandWords, gasWords, groupTitle } from "./peer-words.ts";
import { groupIdOf, ownRecipesQuery } from "./peers.queries.ts";
import { WithheldNotice } from "./withheld-notice.tsx";

/** One peer group: how its shops set every metric, and where the own recipe lies among them. */
export function PeerGroupPage() {
  const { groupId = "" } = useParams();
  const { edition } = useSuspenseQuery(currentEditionQuery).data;
  const { data } = useQuery({ ...editionGroupQuery(edition?.id, groupId), throwOnError: true });
  const key = parsePeerGroupId(groupId);
  if (!key) return <NotFoundPage />;
  if (!edition) return <NoEditionYet />;
  return data ? <Group edition={edition} figures={data.figures} listed={data.listed} /> : <Skeleton lines={10} />;
}

interface GroupProps {
  edition: PublishedEdition;
  figures: PeerGroupFigures;
  listed: readonly ListedRecipe[];
}

function Group({ edition, figures, listed }: GroupProps) {
  const { units } = useSession();
  const { key } = figures;
  const own = useOwnHere();
  const shops = figures.status === "released" ? [countWords(figures.shops)] : [];
  const facts = [bandWords(key, units), gasWords(key), ...shops, `edition of ${formatDate(edition.date)}`];
  const back = { to: `/peers?metal=${key.material}&gas=${key.gas}`, label: "Map of peers" };
  return (
    <>
      <PageHeader title={groupTitle(key)} facts={facts.join(" · ")} back={back} />
      <div className="grid gap-8 lg:grid-cols-[minmax(0,1fr)_18.75rem]">
        <div className="min-w-0 space-y-4">
          <OwnRecipeChoice recipes={own.recipes} chosen={own.chosen} onChoose={own.choose} />
          {figures.status === "released" ? (
            <>
              <HeldNote group={figures} edition={edition} />
              <MetricRows group={figures} own={own.chosen?.version.content.setpoints ?? null} units={units} />
            </>
          ) : (
            <WithheldNotice figures={figures} />
          )}
        </div>
        <GroupAside figures={figures} own={own.chosen} known={own.known} />
      </div>
      {figures.status === "released" ? <ListedRecipes recipes={listed} groupKey={key} /> : null}
    </>
  );
}

const defaults = { recipe: "" };

interface OwnHere {
  /** False while the book is on its way: then nothing is said of what is not in it. */
  known: boolean;
  recipes: readonly Recipe[];
  chosen: Recipe | undefined;
  choose: (id: string) => void;
}

/** The own recipes of this group; unless the URL says which, a proven one first, the newest among them. */
function useOwnHere(): OwnHere {
  const { groupId = "" } = useParams();
  const { shop } = useSession();
  const key = parsePeerGroupId(groupId);
  const [state, change] = useUrlState(defaults);
  const mine = useQuery({
    ...ownRecipesQuery(key?.material ?? "mild-steel"),
    enabled: shop?.state === "active",
    throwOnError: true,
  });
  const recipes = (mine.data ?? []).filter((recipe) => groupIdOf(recipe) === groupId);
  const chosen =
    recipes.find(({ id }) => id === state.recipe) ?? recipes.find((recipe) => recipe.state === "proven") ?? recipes[0];
  return { known: !mine.isLoading, recipes, chosen, choose: (recipe) => change({ recipe }) };
}
