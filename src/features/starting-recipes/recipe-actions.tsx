import { Download, Printer } from "lucide-react";
import { useNavigate } from "react-router-dom";
import type { StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import {
  getStartingRecipe,
  getStartingRecipeCsv,
  type StartingRecipeQuery,
} from "#shared/contracts/starting-recipes.ts";
import { urlOf } from "../../lib/api.ts";
import { Button, buttonClasses } from "../../ui/button.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { useSaveStartingRecipe } from "./starting-recipes.queries.ts";

export interface RecipeActionsProps {
  query: StartingRecipeQuery;
  recipe: StartingRecipe;
  /** The recipe in sight is not yet the one asked for. */
  behind: boolean;
}

/** To the book, to a file, to paper. */
export function RecipeActions({ query, recipe, behind }: RecipeActionsProps) {
  const navigate = useNavigate();
  const save = useSaveStartingRecipe();
  const fileName = `starting-recipe-${query.material}-${query.thicknessMm}mm.json`;

  // Stays so until the draft's page is there: a second press meanwhile must not make a second draft.
  const isSaved = save.isPending || save.isSuccess;

  async function keep() {
    try {
      const kept = await save.mutateAsync(query);
      showToast("Kept in the book. It is proven once a test cut is acceptable.");
      await navigate(`/recipes/${kept.id}`);
    } catch (error) {
      showToast(error instanceof Error ? error.message : "It was not saved.", { kind: "stop" });
    }
  }

  return (
    <div className="print:hidden">
      <div className="flex flex-wrap gap-2">
        <Button kind="primary" pending={behind || isSaved} disabled={recipe.nozzle.nozzleMm === null} onClick={keep}>
          Save to book
        </Button>
        <a className={buttonClasses("secondary")} href={urlOf(getStartingRecipe, { query })} download={fileName}>
          <Download aria-hidden="true" size={18} /> JSON
        </a>
        <a className={buttonClasses("secondary")} href={urlOf(getStartingRecipeCsv, { query })} download="">
          <Download aria-hidden="true" size={18} /> CSV
        </a>
        <Button onClick={() => window.print()}>
          <Printer aria-hidden="true" size={18} /> Print
        </Button>
      </div>
      {recipe.nozzle.nozzleMm === null ? (
        <p className="mt-2 text-sm text-soft">To save it, choose the nozzle you will fit.</p>
      ) : null}
    </div>
  );
}
