import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import type { Machine } from "#shared/contracts/machines.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { noAnswers, queryOf, readAnswers } from "./answers.ts";
import { Questions } from "./questions.tsx";
import { RecipeActions } from "./recipe-actions.tsx";
import { StartingRecipeView } from "./starting-recipe-view.tsx";
import { startingRecipeQuery } from "./starting-recipes.queries.ts";
import { useDebounced } from "./use-debounced.ts";

/** Three answers and a machine; the starting recipe follows as they change. */
export function StartPage() {
  const [first, ...more] = useSuspenseQuery(machinesQuery).data.items;
  return (
    <>
      <div className="print:hidden">
        <PageHeader title="Starting recipe" facts="For a metal you have not proven yet, fitted to your machine" />
      </div>
      {first ? <Workbench machines={[first, ...more]} /> : <NoMachine />}
    </>
  );
}

/** Long enough to finish a fraction, short enough to feel at once. */
const pauseMs = 300;

function Workbench({ machines }: { machines: readonly [Machine, ...Machine[]] }) {
  const { units } = useSession();
  const [url, change] = useUrlState(noAnswers);
  const answers = readAnswers(url, machines);
  const query = queryOf(answers);
  const settled = useDebounced(query, pauseMs);
  const { data, error, isPlaceholderData } = useQuery(startingRecipeQuery(settled, units));
  const behind = isPlaceholderData || JSON.stringify(settled) !== JSON.stringify(query);

  return (
    <div className="grid gap-8 lg:grid-cols-[17rem_minmax(0,1fr)] lg:gap-12 print:block">
      <Questions url={url} change={change} answers={answers} machines={machines} units={units} />
      <div className="min-w-0" aria-live="polite" aria-busy={query !== null && behind}>
        {query === null ? <NothingAsked /> : null}
        {query && error && !behind ? (
          <Notice kind="stop" title="No starting recipe came back">
            <p>{error.message}</p>
          </Notice>
        ) : null}
        {query && !data && !error ? <Skeleton lines={10} /> : null}
        {query && data ? (
          <StartingRecipeView
            recipe={data}
            machine={answers.machine}
            behind={behind}
            actions={<RecipeActions query={query} recipe={data} behind={behind} />}
          />
        ) : null}
      </div>
    </div>
  );
}

function NothingAsked() {
  return (
    <EmptyState title="Say how thick the sheet is">
      In whatever it is sold by: 3 mm, 1/8 in or 11 ga. The recipe then stands here: each number with its range and
      where it comes from, the cautions, and the test cuts that make it your own.
    </EmptyState>
  );
}

function NoMachine() {
  const { shop } = useSession();
  const owner = shop?.role === "owner";
  const action = owner ? (
    <ButtonLink to="/machines/new" kind="primary">
      Add a machine
    </ButtonLink>
  ) : null;
  return (
    <EmptyState title="Describe your machine first" action={action}>
      A starting recipe keeps within what the table and the power source can do: largest current, top feed, air pressure
      at the torch. {owner ? null : "Ask the owner of the shop to add the machine."}
    </EmptyState>
  );
}
