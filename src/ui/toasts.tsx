import { X } from "lucide-react";
import { useSyncExternalStore } from "react";
import { classNames } from "./class-names.ts";
import { dismissToast, type Toast, toastStore } from "./toast-store.ts";

/** Where toasts appear; stands once in the frame. Read out politely, never taking focus. */
export function Toasts() {
  const toasts = useSyncExternalStore(toastStore.subscribe, toastStore.read);
  return (
    <section
      aria-label="Messages"
      aria-live="polite"
      data-toasts=""
      className="pointer-events-none fixed inset-x-4 bottom-20 z-30 flex flex-col items-center gap-2 md:bottom-6"
    >
      {toasts.map((toast) => (
        <ToastLine key={toast.id} toast={toast} />
      ))}
    </section>
  );
}

function ToastLine({ toast }: { toast: Toast }) {
  function undo() {
    dismissToast(toast.id);
    toast.undo?.();
  }

  return (
    <div
      className={classNames(
        "pointer-events-auto flex w-full max-w-md items-center gap-2 rounded border border-l-4 bg-surface pl-4 shadow-float",
        toast.kind === "stop" ? "border-stop" : "border-action",
      )}
    >
      <p className="flex-1 py-3">{toast.text}</p>
      {toast.undo ? (
        <button type="button" onClick={undo} className="min-h-touch px-3 font-bold text-action hover:underline">
          Undo
        </button>
      ) : null}
      <button
        type="button"
        aria-label="Dismiss"
        onClick={() => dismissToast(toast.id)}
        className="inline-flex size-11 items-center justify-center text-muted hover:text-ink"
      >
        <X aria-hidden="true" size={18} />
      </button>
    </div>
  );
}
