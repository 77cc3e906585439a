import type { Recipe, RecipeContent } from "#shared/contracts/recipes.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { Button } from "../../ui/button.tsx";
import { Dialog } from "../../ui/dialog.tsx";
import { FactsBeside } from "./facts-beside.tsx";

export type StaleAnswer = "theirs" | "mine" | "neither";

export interface StaleDialogProps {
  stale: { theirs: Recipe; mine: RecipeContent } | undefined;
  units: UnitSystem;
  machineName: (id: string) => string;
  onAnswer: (answer: StaleAnswer) => void;
}

/** Somebody saved meanwhile: shows both, and nothing is overwritten unseen. Every version stays in the history. */
export function StaleDialog({ stale, units, machineName, onAnswer }: StaleDialogProps) {
  if (!stale) return null;
  const { number, changedBy, reason } = stale.theirs.version;
  return (
    <Dialog
      open
      wide
      onClose={() => onAnswer("neither")}
      title="Somebody changed this recipe meanwhile"
      actions={
        <>
          <Button kind="primary" onClick={() => onAnswer("mine")}>
            Save mine as version {number + 1}
          </Button>
          <Button onClick={() => onAnswer("theirs")}>Take theirs, drop mine</Button>
          <Button kind="quiet" onClick={() => onAnswer("neither")}>
            Back to the form
          </Button>
        </>
      }
    >
      <p className="mb-3">
        {changedBy || "Somebody who has left"} saved version {number}
        {reason ? `: “${reason}”` : ""}. Saving yours puts it on top; theirs stays in the history.
      </p>
      <FactsBeside
        left={{ heading: `Theirs, version ${number}`, content: stale.theirs.version.content }}
        right={{ heading: "Yours, not saved", content: stale.mine }}
        units={units}
        machineName={machineName}
        differingOnly
      />
      <p className="mt-2 text-sm text-muted">Everything else is the same in both.</p>
    </Dialog>
  );
}
