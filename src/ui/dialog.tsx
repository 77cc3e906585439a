import { X } from "lucide-react";
import { type ReactNode, useEffect, useId, useRef } from "react";
import { classNames } from "./class-names.ts";

export interface DialogProps {
  open: boolean;
  /** Escape, the close button, or a press beside the dialog. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons along the bottom; the act first, the way out last. */
  actions?: ReactNode;
  wide?: boolean;
}

/** A native modal dialog: the browser traps focus, and closing gives it back to what opened it. */
export function Dialog({ open, onClose, title, children, actions, wide }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const heading = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!open || !element) return;
    const opener = document.activeElement;
    element.showModal();
    return () => {
      element.close();
      if (opener instanceof HTMLElement && opener.isConnected) opener.focus();
    };
  }, [open]);

  if (!open) return null;
  return (
    <dialog
      ref={dialog}
      aria-labelledby={heading}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onMouseUp={(event) => {
        if (event.button === 0 && event.target === event.currentTarget) onClose();
      }}
      className={classNames(
        "w-[calc(100%-2rem)] max-h-[calc(100dvh-2rem)] overflow-y-auto rounded border border-line bg-surface shadow-float",
        wide ? "max-w-3xl" : "max-w-lg",
      )}
    >
      <div className="relative p-5">
        <h2 id={heading} className="mb-3 pr-10 text-lg font-bold">
          {title}
        </h2>
        {children}
        {actions ? <div className="mt-5 flex flex-wrap gap-2">{actions}</div> : null}
        {/* Last, so that a dialog opens with the focus on what it is about. */}
        <CloseButton onClick={onClose} />
      </div>
    </dialog>
  );
}

function CloseButton({ onClick }: { onClick: () => void }) {
  return (
    <button
      type="button"
      aria-label="Close"
      onClick={onClick}
      className="absolute top-2.5 right-2.5 inline-flex size-11 items-center justify-center rounded text-muted hover:bg-sunken hover:text-ink"
    >
      <X aria-hidden="true" size={20} />
    </button>
  );
}
