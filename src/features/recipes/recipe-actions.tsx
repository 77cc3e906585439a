import { Copy, Printer } from "lucide-react";
import { useState } from "react";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button, ButtonLink } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { useRestoreRecipe, useRetireRecipe } from "./recipes.queries.ts";

export function RecipeActions({ recipe }: { recipe: Recipe }) {
  const { shop } = useSession();
  const { id, state } = recipe;
  const isOwner = shop?.role === "owner";
  return (
    <>
      {state === "retired" ? null : (
        <>
          <ButtonLink to={`/recipes/${id}/test-cuts/new`} kind="primary">
            Log a test cut
          </ButtonLink>
          <ButtonLink to={`/recipes/${id}/edit`}>Change</ButtonLink>
        </>
      )}
      <ButtonLink to={`/recipes/new?copy=${id}`} kind="quiet" small className="self-center max-md:-ml-3">
        <Copy aria-hidden="true" size={18} />
        Copy as new
      </ButtonLink>
      <Button kind="quiet" small className="self-center" onClick={() => window.print()}>
        <Printer aria-hidden="true" size={18} />
        Setup sheet
      </Button>
      {isOwner ? state === "retired" ? <Restore recipe={recipe} /> : <Retire recipe={recipe} /> : null}
    </>
  );
}

function Retire({ recipe }: { recipe: Recipe }) {
  const { units } = useSession();
  const [open, setOpen] = useState(false);
  const retire = useRetireRecipe(recipe.id);
  return (
    <>
      <Button kind="quiet" small className="self-center" onClick={() => setOpen(true)}>
        Retire
      </Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title={`Retire ${recipeName(recipe.version.content, units)}?`}
        act="Retire recipe"
        pending={retire.isPending}
        error={retire.error?.message}
        onConfirm={() =>
          retire.mutate(undefined, {
            onSuccess: () => {
              setOpen(false);
              showToast("Retired. It stays in the book to read.");
            },
          })
        }
      >
        <p>It stays in the book with its history and test cuts, to be read.</p>
        <p>
          It takes no changes and no test cuts any more
          {recipe.sharing === "private" ? "" : ", and from the next edition on it is not counted"}. You can bring it
          back.
        </p>
      </ConfirmDialog>
    </>
  );
}

function Restore({ recipe }: { recipe: Recipe }) {
  const [open, setOpen] = useState(false);
  const restore = useRestoreRecipe(recipe.id);
  return (
    <>
      <Button kind="primary" onClick={() => setOpen(true)}>
        Bring back
      </Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title="Bring this recipe back?"
        act="Bring back"
        kind="primary"
        pending={restore.isPending}
        error={restore.error?.message}
        onConfirm={() =>
          restore.mutate(undefined, {
            onSuccess: (now) => {
              setOpen(false);
              showToast(now.state === "proven" ? "Back, and proven as before." : "Back, not proven yet.");
            },
          })
        }
      >
        It can be changed and cut with again. See below how it is shared before the next edition.
      </ConfirmDialog>
    </>
  );
}
