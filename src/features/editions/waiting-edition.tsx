import { useState } from "react";
import type { Edition } from "#shared/contracts/editions.ts";
import { formatInstant } from "#shared/units/dates.ts";
import { formatCount } from "#shared/units/format.ts";
import { asProblem } from "../../lib/form-problems.ts";
import { Button } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { Dialog } from "../../ui/dialog.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { ChangesSummary } from "./changes-summary.tsx";
import { useDiscard, usePublish } from "./editions.queries.ts";

/** A built edition: read what it changes, then publish or discard it. */
export function WaitingEdition({ edition }: { edition: Edition }) {
  const [asking, setAsking] = useState<"publish" | "discard">();
  const close = () => setAsking(undefined);
  return (
    <section aria-labelledby="waiting" className="mb-8 rounded border border-line bg-surface p-4 md:p-5">
      <div className="mb-4 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div>
          <h2 id="waiting" className="text-lg font-bold">
            Edition {edition.number} is built and waits
          </h2>
          <p className="text-muted">
            Built {formatInstant(edition.builtAt)} · shows {formatCount(edition.releasedGroups)} groups · members do not
            see it yet
          </p>
        </div>
        <div className="flex flex-wrap gap-2">
          <Button kind="primary" onClick={() => setAsking("publish")}>
            Publish…
          </Button>
          <Button onClick={() => setAsking("discard")}>Discard…</Button>
        </div>
      </div>
      <ChangesSummary changes={edition.changes} />
      {asking === "publish" ? <PublishDialog edition={edition} onClose={close} /> : null}
      {asking === "discard" ? <DiscardDialog edition={edition} onClose={close} /> : null}
    </section>
  );
}

interface AskProps {
  edition: Edition;
  onClose: () => void;
}

const messageOf = (error: Error | null) => {
  if (!error) return undefined;
  const problem = asProblem(error);
  return problem.detail ?? problem.message;
};

function PublishDialog({ edition, onClose }: AskProps) {
  const publish = usePublish(edition.id);
  const error = messageOf(publish.error);
  const confirm = () =>
    publish.mutateAsync().then(() => {
      onClose();
      showToast(`Edition ${edition.number} is published.`);
    });
  return (
    <Dialog
      open
      wide
      onClose={onClose}
      title={`Publish edition ${edition.number} to every member?`}
      actions={
        <>
          <Button kind="primary" pending={publish.isPending} onClick={confirm}>
            Publish edition {edition.number}
          </Button>
          <Button kind="quiet" onClick={onClose}>
            Not yet
          </Button>
        </>
      }
    >
      <p className="mb-4">
        Members see these figures at once. A published edition is not taken back; the next replaces it.
      </p>
      <ChangesSummary changes={edition.changes} />
      {error ? (
        <p role="alert" className="mt-4 font-bold text-stop">
          {error}
        </p>
      ) : null}
    </Dialog>
  );
}

function DiscardDialog({ edition, onClose }: AskProps) {
  const discard = useDiscard(edition.id);
  return (
    <ConfirmDialog
      open
      onClose={onClose}
      title={`Discard edition ${edition.number}?`}
      act="Discard the edition"
      pending={discard.isPending}
      error={messageOf(discard.error)}
      onConfirm={() =>
        discard.mutate(undefined, {
          onSuccess: () => {
            onClose();
            showToast(`Edition ${edition.number} is discarded.`);
          },
        })
      }
    >
      Its figures are thrown away and its number is not used again. The published edition stands; another can be built
      at any time.
    </ConfirmDialog>
  );
}
