import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactNode, Suspense } from "react";
import { useParams } from "react-router-dom";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { processGasLabels, surfaceLabels } from "#shared/materials/materials.ts";
import { CautionsLine } from "../../lib/cautions.tsx";
import { recipeQuery } from "../../lib/recipe-queries.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { PageHeader } from "../../ui/page-header.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { CheckFirst } from "./check-first.tsx";
import { HeatNote } from "./heat-note.tsx";
import { RecipeActions } from "./recipe-actions.tsx";
import { RecipeHistory } from "./recipe-history.tsx";
import { RecipeOriginLine } from "./recipe-origin.tsx";
import { RecipeStateWord } from "./recipe-state.tsx";
import { SetpointStrips } from "./setpoint-strips.tsx";
import { SetupSheet } from "./setup-sheet.tsx";

export interface RecipePageProps {
  testCuts: (recipe: Recipe) => ReactNode;
  sharing: (recipe: Recipe) => ReactNode;
}

/** One recipe: its numbers among the peers', what was cut with it, how it came to be, and who else sees what of it. */
export function RecipePage({ testCuts, sharing }: RecipePageProps) {
  const { id = "" } = useParams();
  const { units } = useSession();
  const recipe = useSuspenseQuery(recipeQuery(id)).data;
  const { content } = recipe.version;
  const { setpoints, material, processGas: gas, thicknessMm } = content;

  return (
    <>
      <div className="print:hidden">
        <PageHeader
          title={recipeName(content, units)}
          facts={<Facts recipe={recipe} />}
          back={{ to: "/recipes", label: "Recipes" }}
          actions={<RecipeActions recipe={recipe} />}
        />
        <div className="grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,1fr)_19rem]">
          <SetpointStrips recipe={recipe} />
          <aside aria-label="About these numbers" className="space-y-4">
            <CheckFirst recipe={recipe} />
            <HeatNote {...setpoints} {...{ material, thicknessMm, gas }} />
            <CautionsLine {...{ material, gas }} currentA={setpoints.currentA} />
            {content.note ? <NoteToSelf note={content.note} /> : null}
            <RecipeOriginLine origin={recipe.version.origin} />
          </aside>
        </div>
        <div className="mt-10 space-y-10">
          <Suspense fallback={<Skeleton lines={4} />}>{testCuts(recipe)}</Suspense>
          <Suspense fallback={<Skeleton lines={4} />}>
            <RecipeHistory recipe={recipe} />
          </Suspense>
          <Suspense fallback={<Skeleton lines={4} />}>{sharing(recipe)}</Suspense>
        </div>
      </div>
      <SetupSheet recipe={recipe} />
    </>
  );
}

function Facts({ recipe }: { recipe: Recipe }) {
  const { grade, surface, processGas } = recipe.version.content;
  const facts = [recipe.machineName, processGasLabels[processGas], grade, surfaceLabels[surface]].filter(Boolean);
  return (
    <span className="flex flex-wrap items-center gap-x-3">
      <RecipeStateWord state={recipe.state} />
      <span>
        {facts.join(" · ")} · version {recipe.version.number}
      </span>
    </span>
  );
}

function NoteToSelf({ note }: { note: string }) {
  return (
    <section className="rounded border border-line bg-surface p-4">
      <h2 className="font-bold">Note to self</h2>
      <p className="text-sm break-words whitespace-pre-wrap">{note}</p>
    </section>
  );
}
