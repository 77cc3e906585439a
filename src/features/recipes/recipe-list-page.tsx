import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { useDeferredValue } from "react";
import { exportBookCsv, exportBookJson, type Recipe } from "#shared/contracts/recipes.ts";
import { formatCount } from "#shared/units/format.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink, buttonClasses } from "../../ui/button.tsx";
import { classNames } from "../../ui/class-names.ts";
import { EmptyState } from "../../ui/empty-state.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { Pagination } from "../../ui/pagination.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { Table } from "../../ui/table.tsx";
import { useMediaQuery } from "../../ui/use-media-query.ts";
import { RecipeCard } from "./recipe-card.tsx";
import { recipeColumns } from "./recipe-columns.tsx";
import { RecipeFilters } from "./recipe-filters.tsx";
import { isFiltered, listDefaults, listInput, sortPatch, tableSort } from "./recipe-list-state.ts";
import { recipesQuery } from "./recipes.queries.ts";

export function RecipeListPage() {
  const { units } = useSession();
  const [state, change] = useUrlState(listDefaults);
  const machines = useSuspenseQuery(machinesQuery).data.items;
  // Typing stays quick: the list follows the last letter when there is time for it.
  const asked = useDeferredValue(state);
  const { data, error } = useQuery(recipesQuery(listInput(asked, units)));
  if (error && !data) throw error;
  const filtered = isFiltered(state);
  const total = data?.total ?? 0;
  const isEmptyBook = data !== undefined && total === 0 && !filtered;

  return (
    <>
      <PageHeader title="Recipes" facts="The shop's own book" actions={isEmptyBook ? null : <ListActions />} />
      {isEmptyBook ? (
        <EmptyBook hasMachine={machines.length > 0} />
      ) : (
        <>
          <RecipeFilters state={state} onChange={change} machines={machines} units={units} />
          {data === undefined ? <Skeleton lines={8} /> : null}
          {data && total === 0 ? (
            <EmptyState title="Nothing fits these filters">Take one away, or clear them all.</EmptyState>
          ) : null}
          {data && total > 0 ? <RecipeTable {...{ recipes: data.items, state, change }} /> : null}
          {data && total > 0 ? (
            <Pagination
              next={data.next}
              summary={`${formatCount(data.items.length)} of ${formatCount(total)} ${total === 1 ? "recipe" : "recipes"}`}
              backLabel="Back"
              nextLabel="More"
            />
          ) : null}
        </>
      )}
    </>
  );
}

/** A phone finds the exports in the shop's menu. */
function ListActions() {
  return (
    <>
      <a href={exportBookCsv.path} download className={classNames(buttonClasses("quiet"), "max-md:hidden")}>
        Export table
      </a>
      <a href={exportBookJson.path} download className={classNames(buttonClasses("quiet"), "max-md:hidden")}>
        Export whole book
      </a>
      <ButtonLink to="/recipes/new" kind="primary" data-new="">
        Write a recipe
      </ButtonLink>
    </>
  );
}

interface RecipeTableProps {
  recipes: readonly Recipe[];
  state: typeof listDefaults;
  change: (patch: Partial<typeof listDefaults>) => void;
}

function RecipeTable({ recipes, state, change }: RecipeTableProps) {
  const { units } = useSession();
  const narrow = useMediaQuery("screen and (max-width: 79.99rem)");
  return (
    <Table
      caption="The shop's recipes"
      columns={recipeColumns(units, narrow)}
      rows={recipes}
      rowKey={(recipe) => recipe.id}
      sort={tableSort(state)}
      onSort={(sort) => change(sortPatch(sort))}
      renderCard={(recipe) => <RecipeCard recipe={recipe} units={units} />}
    />
  );
}

function EmptyBook({ hasMachine }: { hasMachine: boolean }) {
  const { shop } = useSession();
  if (!hasMachine) {
    return (
      <EmptyState
        title="First the machine, then its recipes"
        action={
          shop?.role === "owner" ? (
            <ButtonLink to="/machines/new" kind="primary" data-new="">
              Add a machine
            </ButtonLink>
          ) : null
        }
      >
        A recipe belongs to the machine it cuts on.{" "}
        {shop?.role === "owner" ? "Describe yours first." : "Ask the owner to describe it."}
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title="The book is empty"
      action={
        <>
          <ButtonLink to="/recipes/new" kind="primary" data-new="">
            Write the first recipe
          </ButtonLink>
          <ButtonLink to="/start">Get a starting recipe</ButtonLink>
        </>
      }
    >
      Begin with the metal you cut most: the numbers taped to the power source will do. For a metal you have never cut,
      a starting recipe gives you numbers to try.
    </EmptyState>
  );
}
