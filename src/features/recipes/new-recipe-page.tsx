import { useSuspenseQuery } from "@tanstack/react-query";
import { useNavigate, useSearchParams } from "react-router-dom";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { recipeQuery } from "../../lib/recipe-queries.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { RecipeForm } from "./recipe-form.tsx";
import { emptyRecipe, type RecipeFormOutput, recipeValues } from "./recipe-form-values.ts";
import { useCreateRecipe } from "./recipes.queries.ts";

const back = { to: "/recipes", label: "Recipes" };

/** A new recipe, empty or as a copy: /recipes/new?copy=<id>. */
export function NewRecipePage() {
  const { shop } = useSession();
  const [params] = useSearchParams();
  const machines = useSuspenseQuery(machinesQuery).data.items;
  const copied = params.get("copy");
  return (
    <>
      <PageHeader title={copied ? "Copy a recipe" : "Write a recipe"} back={back} />
      {machines.length === 0 ? (
        <EmptyState
          title="First the machine"
          action={
            shop?.role === "owner" ? (
              <ButtonLink to="/machines/new" kind="primary">
                Add a machine
              </ButtonLink>
            ) : null
          }
        >
          A recipe belongs to the machine it cuts on, and there is none yet.
        </EmptyState>
      ) : copied ? (
        <CopyForm id={copied} />
      ) : (
        <EmptyForm />
      )}
    </>
  );
}

function EmptyForm() {
  const { units } = useSession();
  const machines = useSuspenseQuery(machinesQuery).data.items;
  const save = useSaveNew();
  const only = machines.length === 1 ? machines[0]!.id : "";
  return (
    <RecipeForm
      id="recipe:new"
      units={units}
      machines={machines}
      defaults={emptyRecipe(only)}
      act="Keep recipe"
      onSave={save}
    />
  );
}

function CopyForm({ id }: { id: string }) {
  const { units } = useSession();
  const machines = useSuspenseQuery(machinesQuery).data.items;
  const { content } = useSuspenseQuery(recipeQuery(id)).data.version;
  const save = useSaveNew();
  return (
    <RecipeForm
      id={`recipe:copy:${id}`}
      units={units}
      machines={machines}
      defaults={recipeValues(content, units, 0)}
      act="Keep as new recipe"
      onSave={save}
    >
      <Notice title={`A copy of ${recipeName(content, units)}`}>
        <p className="text-sm">It starts not proven, with a history of its own. The one copied stays as it is.</p>
      </Notice>
    </RecipeForm>
  );
}

function useSaveNew() {
  const navigate = useNavigate();
  const create = useCreateRecipe();
  return async ({ content }: RecipeFormOutput, key: string) => {
    const { id } = await create.mutateAsync({ content, key });
    showToast("Kept. Log a test cut to prove it.");
    await navigate(`/recipes/${id}`);
  };
}
