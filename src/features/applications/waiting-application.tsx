import { useId, useState } from "react";
import { type Application, declineApplication } from "#shared/contracts/applications.ts";
import { formatDate } from "#shared/units/dates.ts";
import { asProblem } from "../../lib/form-problems.ts";
import { ReasonDialog } from "../../lib/reason-dialog.tsx";
import { Button } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { isAlreadyDecided, useAdmit, useDecline } from "./applications.queries.ts";

interface WaitingApplicationProps {
  application: Application;
  /** Somebody else had decided before. */
  onOvertaken: () => void;
}

export function WaitingApplication({ application, onOvertaken }: WaitingApplicationProps) {
  const heading = useId();
  const [asking, setAsking] = useState<"admit" | "decline">();
  const { shopName, place, contactName, email, machines, about, createdAt } = application;
  const facts = [
    ["Who asks", contactName],
    ["E-mail", email],
    ["Tables", machines],
    ["Sent", formatDate(createdAt)],
  ] as const;
  const dialog = { application, onOvertaken, onClose: () => setAsking(undefined) };

  return (
    <article aria-labelledby={heading} className="rounded border border-line bg-surface p-4 md:p-5">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <h2 id={heading} className="text-lg font-bold break-words">
            {shopName}
          </h2>
          <p className="text-muted">{place}</p>
        </div>
        <div className="flex gap-2">
          <Button kind="primary" aria-describedby={heading} onClick={() => setAsking("admit")}>
            Admit
          </Button>
          <Button aria-describedby={heading} onClick={() => setAsking("decline")}>
            Decline
          </Button>
        </div>
      </div>
      <dl className="mt-3 grid gap-x-8 gap-y-2 sm:grid-cols-[auto_auto_auto_auto] sm:justify-start">
        {facts.map(([name, value]) => (
          <div key={name} className="min-w-0">
            <dt className="text-sm text-muted">{name}</dt>
            <dd className="break-words">{value}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 max-w-text whitespace-pre-line break-words">{about}</p>
      {asking === "admit" ? <AdmitDialog {...dialog} /> : null}
      {asking === "decline" ? <DeclineDialog {...dialog} /> : null}
    </article>
  );
}

interface DecisionProps extends WaitingApplicationProps {
  onClose: () => void;
}

function AdmitDialog({ application, onClose, onOvertaken }: DecisionProps) {
  const admit = useAdmit();
  const problem = admit.error ? asProblem(admit.error) : undefined;

  function confirm() {
    admit.mutate(application, {
      onSuccess: () => {
        onClose();
        showToast(`${application.shopName} is admitted.`);
      },
      onError: (error) => {
        if (!isAlreadyDecided(error)) return;
        onClose();
        onOvertaken();
      },
    });
  }

  return (
    <ConfirmDialog
      open
      onClose={onClose}
      title={`Admit ${application.shopName}?`}
      act="Admit the shop"
      kind="primary"
      pending={admit.isPending}
      error={problem && (problem.detail ?? problem.message)}
      onConfirm={confirm}
    >
      <p>
        The shop becomes a member. Whoever next signs in as <b className="break-words">{application.email}</b> is its
        owner: make sure the address is theirs.
      </p>
      <p>A member can be suspended later; an admission is not taken back.</p>
    </ConfirmDialog>
  );
}

function DeclineDialog({ application, onClose, onOvertaken }: DecisionProps) {
  const decline = useDecline();

  async function send(reason: string, key: string) {
    try {
      await decline.mutateAsync({ application, reason, key });
    } catch (error) {
      if (!isAlreadyDecided(error)) throw error;
      onClose();
      onOvertaken();
      return;
    }
    onClose();
    showToast(`${application.shopName} is declined.`);
  }

  return (
    <ReasonDialog
      onClose={onClose}
      title={`Decline ${application.shopName}?`}
      label="Reason"
      hint="The applicant reads it as you write it."
      reason={declineApplication.body.shape.reason}
      act="Decline the application"
      formId={`decline:${application.id}`}
      onSend={send}
    >
      <p>The decision stands. The shop may ask again with a new application.</p>
    </ReasonDialog>
  );
}
