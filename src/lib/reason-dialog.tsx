import type { ReactNode } from "react";
import { z } from "zod";
import { Dialog } from "../ui/dialog.tsx";
import { DialogButtons } from "../ui/dialog-buttons.tsx";
import { TextAreaField } from "../ui/text-field.tsx";
import { useProblemForm } from "./form.ts";
import { DraftNotice, FormProblem } from "./form-problem.tsx";

export interface ReasonDialogProps {
  onClose: () => void;
  title: string;
  /** What the act does, before it is done. */
  children: ReactNode;
  label: string;
  hint: string;
  /** The contract's rule for the reason. */
  reason: z.ZodType<string, string>;
  /** The act in words, as on the button. */
  act: string;
  /** Names the draft of the reason. */
  formId: string;
  onSend: (reason: string, idempotencyKey: string) => Promise<unknown>;
}

/** An act that somebody will have to explain later: it asks for the reason first. Mount it to open it. */
export function ReasonDialog(props: ReasonDialogProps) {
  const { onClose, title, children, label, hint, reason, act, formId, onSend } = props;
  const f = useProblemForm({
    id: formId,
    schema: z.object({ reason }),
    defaults: { reason: "" },
    submit: (output, { idempotencyKey }) => onSend(output.reason, idempotencyKey),
  });

  return (
    <Dialog open title={title} onClose={onClose}>
      <form onSubmit={f.onSubmit} noValidate className="space-y-4">
        <div className="space-y-2">{children}</div>
        <DraftNotice restored={f.restored} onStartOver={f.startOver} />
        <FormProblem problem={f.problem} />
        <TextAreaField label={label} hint={hint} rows={3} {...f.field("reason")} />
        <DialogButtons act={act} kind="danger" pending={f.pending} onClose={onClose} />
      </form>
    </Dialog>
  );
}
