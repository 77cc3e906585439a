import { useQueryClient, useSuspenseQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useNavigate, useParams } from "react-router-dom";
import { Recipe, type RecipeContent } from "#shared/contracts/recipes.ts";
import { ApiProblem } from "../../lib/api-problem.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { recipeQuery } from "../../lib/recipe-queries.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { RecipeForm } from "./recipe-form.tsx";
import { type RecipeFormOutput, recipeValues } from "./recipe-form-values.ts";
import { type RecipeChange, useChangeRecipe } from "./recipes.queries.ts";
import { type StaleAnswer, StaleDialog } from "./stale-dialog.tsx";
import { useQuestion } from "./use-question.ts";

export function EditRecipePage() {
  const { id = "" } = useParams();
  const { units } = useSession();
  const machines = useSuspenseQuery(machinesQuery).data.items;
  const newest = useSuspenseQuery(recipeQuery(id)).data;
  // The form keeps to the version it began with, whatever is fetched behind it meanwhile.
  const [recipe] = useState(newest);
  const { save, stale, answer } = useSaveChange(id);
  const machineName = (machineId: string) => machines.find((machine) => machine.id === machineId)?.name ?? "";
  const name = recipeName(recipe.version.content, units);

  return (
    <>
      <PageHeader
        title="Change the recipe"
        documentTitle={`Change ${name}`}
        back={{ to: `/recipes/${id}`, label: name }}
      />
      {recipe.state === "retired" ? (
        <Notice kind="watch" title="This recipe is retired">
          Bring it back before changing it.
        </Notice>
      ) : (
        <RecipeForm
          id={`recipe:${id}`}
          units={units}
          machines={machines}
          defaults={recipeValues(recipe.version.content, units, recipe.version.number)}
          isChange
          act="Save as new version"
          onSave={save}
        />
      )}
      <StaleDialog stale={stale} units={units} machineName={machineName} onAnswer={answer} />
    </>
  );
}

interface Stale {
  theirs: Recipe;
  mine: RecipeContent;
}

/** Saves a change and goes back to the recipe; where somebody was quicker, asks whose version shall stand. */
function useSaveChange(id: string) {
  const navigate = useNavigate();
  const queries = useQueryClient();
  const change = useChangeRecipe(id);
  const question = useQuestion<Stale, StaleAnswer>();

  async function save(output: RecipeFormOutput): Promise<void> {
    const theirs = await sendOrFindTheirs(output);
    if (theirs === undefined) return done("Saved.");
    const answer = await question.ask({ theirs, mine: output.content });
    if (answer === "neither") throw keptProblem(theirs);
    if (answer === "mine") return save({ ...output, baseVersion: theirs.version.number });
    queries.setQueryData(recipeQuery(id).queryKey, theirs);
    return done(`Version ${theirs.version.number} stands. Yours was dropped.`);
  }

  /** The recipe as it stands now, where the change was refused for being stale. */
  async function sendOrFindTheirs(body: RecipeChange): Promise<Recipe | undefined> {
    try {
      await change.mutateAsync(body);
      return undefined;
    } catch (error) {
      if (!(error instanceof ApiProblem) || error.kind !== "stale-version") throw error;
      const current = Recipe.safeParse(error.current);
      if (!current.success) throw error;
      return current.data;
    }
  }

  async function done(words: string): Promise<void> {
    showToast(words);
    await navigate(`/recipes/${id}`);
  }

  return { save, stale: question.asked, answer: question.answer };
}

const keptProblem = ({ version }: Recipe) =>
  new ApiProblem("stale-version", {
    title: `Not saved: version ${version.number} is newer than the one you began with`,
    detail: "What you typed is still here. Save again to see both side by side.",
    status: 409,
  });
