import { ChevronDown } from "lucide-react";
import { type ReactNode, useEffect, useId, useRef, useState } from "react";

export interface MenuProps {
  /** Seen on the button. */
  label: ReactNode;
  /** Read out instead, where the label alone does not say enough. */
  accessibleName?: string;
  children: (close: () => void) => ReactNode;
}

/** A button that shows a panel of links and settings below it. Escape or a press elsewhere closes it. */
export function Menu({ label, accessibleName, children }: MenuProps) {
  const [open, setOpen] = useState(false);
  const id = useId();
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);

  useEffect(() => {
    if (!open) return;
    const pressed = (event: Event) => {
      if (event.target instanceof Node && !root.current?.contains(event.target)) setOpen(false);
    };
    const typed = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      setOpen(false);
      button.current?.focus();
    };
    document.addEventListener("pointerdown", pressed);
    document.addEventListener("focusin", pressed);
    document.addEventListener("keydown", typed);
    return () => {
      document.removeEventListener("pointerdown", pressed);
      document.removeEventListener("focusin", pressed);
      document.removeEventListener("keydown", typed);
    };
  }, [open]);

  return (
    <div ref={root} className="relative">
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        aria-label={accessibleName}
        onClick={() => setOpen(!open)}
        className="inline-flex min-h-touch max-w-[50vw] items-center gap-1 rounded px-2 text-sm text-muted hover:text-ink"
      >
        <span className="truncate">{label}</span>
        <ChevronDown aria-hidden="true" size={16} className="shrink-0" />
      </button>
      {open ? (
        <div
          id={id}
          className="absolute top-full right-0 z-40 mt-1 w-72 rounded border border-line bg-surface p-2 shadow-float"
        >
          {children(() => setOpen(false))}
        </div>
      ) : null}
    </div>
  );
}
