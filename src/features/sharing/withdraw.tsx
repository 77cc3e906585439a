import { useState } from "react";
import { Button } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { useChangeSharing } from "./sharing.queries.ts";
import { savedWords } from "./sharing-words.ts";

/** Takes a recipe back from the network. Always possible. */
export function Withdraw({ recipeId, onDone }: { recipeId: string; onDone: () => void }) {
  const [open, setOpen] = useState(false);
  const change = useChangeSharing(recipeId);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Withdraw</Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title="Withdraw this recipe from the network?"
        act="Withdraw"
        pending={change.isPending}
        error={change.error?.message}
        onConfirm={() =>
          change.mutate(
            { level: "private" },
            {
              onSuccess: () => {
                setOpen(false);
                showToast(savedWords.private);
                onDone();
              },
            },
          )
        }
      >
        <p>From the next edition on it is in no figure and on no list, and your words beside it are deleted.</p>
        <p>Editions already published stay as they are. You can share it again.</p>
      </ConfirmDialog>
    </>
  );
}
