import { useState } from "react";
import { type Member, suspendMember } from "#shared/contracts/members.ts";
import { asProblem } from "../../lib/form-problems.ts";
import { ReasonDialog } from "../../lib/reason-dialog.tsx";
import { Button } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { useReinstate, useSuspend } from "./members.queries.ts";

/** What an admin can do about a member, each asked for once more. */
export function MemberActs({ member }: { member: Member }) {
  // What was asked stays asked, even if the member's state moves below the open dialog.
  const [asking, setAsking] = useState<"suspend" | "reinstate">();
  const close = () => setAsking(undefined);
  const suspended = member.state === "suspended";
  const word = suspended ? "Reinstate" : "Suspend";
  return (
    <>
      <Button
        small
        kind={suspended ? "secondary" : "quiet"}
        aria-label={`${word} ${member.name}`}
        onClick={() => setAsking(suspended ? "reinstate" : "suspend")}
      >
        {word}
      </Button>
      {asking === "suspend" ? <SuspendDialog member={member} onClose={close} /> : null}
      {asking === "reinstate" ? <ReinstateDialog member={member} onClose={close} /> : null}
    </>
  );
}

interface AskProps {
  member: Member;
  onClose: () => void;
}

function SuspendDialog({ member, onClose }: AskProps) {
  const suspend = useSuspend(member);

  async function send(reason: string, key: string) {
    await suspend.mutateAsync({ reason, key });
    onClose();
    showToast(`${member.name} is suspended.`);
  }

  return (
    <ReasonDialog
      onClose={onClose}
      title={`Suspend ${member.name}?`}
      label="Reason"
      hint="Kept in the audit log and shown to admins. The shop does not read it here: tell them."
      reason={suspendMember.body.shape.reason}
      act="Suspend the shop"
      formId={`suspend:${member.id}`}
      onSend={send}
    >
      <ul className="list-disc space-y-1 pl-5">
        <li>Its people's sessions end at once. Signed in again, they see only that the shop is suspended.</li>
        <li>What it shares leaves the next edition. Editions already published stay as they are.</li>
        <li>Its book stays whole and waits. Reinstating the shop brings everything back.</li>
      </ul>
    </ReasonDialog>
  );
}

function ReinstateDialog({ member, onClose }: AskProps) {
  const reinstate = useReinstate(member);
  const problem = reinstate.error ? asProblem(reinstate.error) : undefined;
  return (
    <ConfirmDialog
      open
      onClose={onClose}
      title={`Reinstate ${member.name}?`}
      act="Reinstate the shop"
      kind="primary"
      pending={reinstate.isPending}
      error={problem && (problem.detail ?? problem.message)}
      onConfirm={() =>
        reinstate.mutate(undefined, {
          onSuccess: () => {
            onClose();
            showToast(`${member.name} is active again.`);
          },
        })
      }
    >
      <p>Its people can work again from their next page on. What it shares counts from the next edition on.</p>
      {member.stateReason ? (
        <p className="text-soft">
          Suspended for: <q className="break-words">{member.stateReason}</q>. The reason stays in the audit log.
        </p>
      ) : null}
    </ConfirmDialog>
  );
}
