import { type FormEvent, type ReactNode, useEffect, useRef, useState } from "react";
import { Dialog } from "./dialog.tsx";
import { DialogButtons } from "./dialog-buttons.tsx";
import { TextField } from "./text-field.tsx";

export interface ConfirmDialogProps {
  open: boolean;
  onClose: () => void;
  title: string;
  /** What is lost or changed, and whether it can be undone. */
  children: ReactNode;
  /** The act in words, as on the button: "Delete recipe". */
  act: string;
  onConfirm: () => unknown;
  /** Asks for this name to be typed first, where what is lost cannot be brought back. */
  typeName?: string;
  kind?: "danger" | "primary";
  pending?: boolean;
  error?: string | undefined;
}

export function ConfirmDialog(props: ConfirmDialogProps) {
  // Mounted anew each time it opens, so what was typed before is not there.
  return props.open ? <OpenConfirmDialog {...props} /> : null;
}

function OpenConfirmDialog(props: ConfirmDialogProps) {
  const { onClose, title, children, act, onConfirm, typeName, kind = "danger", pending = false, error } = props;
  const [typed, setTyped] = useState("");
  const [problem, setProblem] = useState<string>();
  // A quick second press comes before `pending` does: it must not send twice. Free again once the act has ended.
  const acted = useRef(false);
  useEffect(() => {
    if (!pending) acted.current = false;
  }, [pending]);

  function confirm(event: FormEvent) {
    event.preventDefault();
    if (pending || acted.current) return;
    if (typeName !== undefined && typed.trim() !== typeName.trim()) {
      setProblem(`This does not match. Type ${typeName}`);
      return;
    }
    acted.current = true;
    onConfirm();
  }

  return (
    <Dialog open title={title} onClose={onClose}>
      <form onSubmit={confirm} noValidate className="space-y-4">
        <div className="space-y-2">{children}</div>
        {typeName === undefined ? null : (
          <TextField
            label={`Type ${typeName} to confirm`}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
            error={problem}
            spellCheck={false}
          />
        )}
        {error ? (
          <p role="alert" className="font-bold text-stop">
            {error}
          </p>
        ) : null}
        <DialogButtons act={act} kind={kind} pending={pending} onClose={onClose} />
      </form>
    </Dialog>
  );
}
