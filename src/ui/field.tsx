import { CircleAlert } from "lucide-react";
import { type ReactNode, useId } from "react";
import { classNames } from "./class-names.ts";

export interface FieldTexts {
  label: ReactNode;
  /** What to type or what it is for, before anything is wrong. */
  hint?: ReactNode;
  /** What is wrong and what is allowed, in the member's unit. */
  error?: string | undefined;
  /** Marked in words; everything else is needed. */
  optional?: boolean | undefined;
  className?: string | undefined;
}

/** What a control needs to belong to its field. */
export interface FieldControl {
  id: string;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
}

export interface FieldProps extends FieldTexts {
  /** Below the control, read out with it: a live reading, a count. */
  note?: ReactNode;
  children: (control: FieldControl) => ReactNode;
}

export const controlClasses = classNames(
  "w-full min-h-touch rounded border border-line-strong bg-surface px-3 py-2 text-base text-ink",
  "placeholder:text-muted aria-invalid:border-stop aria-invalid:ring-1 aria-invalid:ring-stop",
  "disabled:cursor-not-allowed disabled:bg-sunken disabled:text-muted [&[readonly]]:bg-sunken",
);

export function FieldError({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} className="flex items-start gap-1.5 text-sm font-bold text-stop">
      <CircleAlert aria-hidden="true" size={16} className="mt-0.5 shrink-0" />
      <span>{children}</span>
    </p>
  );
}

export function Optional() {
  return (
    <>
      {" "}
      <span className="font-normal text-muted">(optional)</span>
    </>
  );
}

/** Label above, control, then what is wrong or what to know. */
export function Field({ label, hint, error, optional, className, note, children }: FieldProps) {
  const id = useId();
  const ids = { hint: `${id}-hint`, note: `${id}-note`, error: `${id}-error` };
  const described = [error && ids.error, note && ids.note, hint && ids.hint].filter(Boolean).join(" ");

  return (
    <div className={classNames("space-y-1", className)}>
      <label htmlFor={id} className="block text-base font-bold">
        {label}
        {optional ? <Optional /> : null}
      </label>
      {hint ? (
        <p id={ids.hint} className="text-sm text-muted">
          {hint}
        </p>
      ) : null}
      {children({ id, "aria-describedby": described || undefined, "aria-invalid": error ? true : undefined })}
      {note ? (
        <p id={ids.note} className="text-sm text-soft">
          {note}
        </p>
      ) : null}
      {error ? <FieldError id={ids.error}>{error}</FieldError> : null}
    </div>
  );
}
