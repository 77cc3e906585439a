import { type ComponentProps, type MouseEvent, useState } from "react";
import { Link, type LinkProps } from "react-router-dom";
import { classNames } from "./class-names.ts";

export type ButtonKind = "primary" | "secondary" | "quiet" | "danger";

const kinds: Record<ButtonKind, string> = {
  primary: "border-action bg-action text-on-action hover:border-action-hover hover:bg-action-hover",
  secondary: "border-action bg-surface text-action hover:bg-action-soft",
  quiet: "border-transparent text-action hover:bg-action-soft",
  danger: "border-danger bg-danger text-on-danger hover:border-danger-hover hover:bg-danger-hover",
};

/** The look of a button, for what is a button by looks only (a link, a file's label). */
export function buttonClasses(kind: ButtonKind = "secondary", small = false): string {
  return classNames(
    "inline-flex items-center justify-center gap-2 rounded border font-bold transition-colors",
    "disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:cursor-progress aria-disabled:opacity-75",
    small ? "min-h-9 px-3 text-sm pointer-coarse:min-h-touch" : "min-h-touch px-4 text-base",
    kinds[kind],
  );
}

export interface ButtonProps extends Omit<ComponentProps<"button">, "onClick"> {
  kind?: ButtonKind;
  small?: boolean;
  /** While true the button stays focusable but does nothing, so one act is sent once. */
  pending?: boolean;
  /** A promise returned here makes the button pending until it settles. */
  onClick?: (event: MouseEvent<HTMLButtonElement>) => unknown;
}

export function Button({ kind, small, pending = false, onClick, className, type = "button", ...rest }: ButtonProps) {
  const [running, setRunning] = useState(false);
  const busy = pending || running;

  function act(event: MouseEvent<HTMLButtonElement>) {
    if (busy) {
      event.preventDefault();
      return;
    }
    const outcome = onClick?.(event);
    if (!(outcome instanceof Promise)) return;
    setRunning(true);
    void outcome.finally(() => setRunning(false)).catch(() => {}); // the caller shows its own problems
  }

  return (
    <button
      {...rest}
      type={type}
      onClick={act}
      aria-disabled={busy || undefined}
      aria-busy={busy || undefined}
      className={classNames(buttonClasses(kind, small), className)}
    />
  );
}

export interface ButtonLinkProps extends LinkProps {
  kind?: ButtonKind;
  small?: boolean;
}

/** A place to go that weighs as much as a button. */
export function ButtonLink({ kind, small, className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={classNames(buttonClasses(kind, small), className)} />;
}
