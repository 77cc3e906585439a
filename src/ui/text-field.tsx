import type { ComponentProps } from "react";
import { classNames } from "./class-names.ts";
import { controlClasses, Field, type FieldTexts } from "./field.tsx";

export interface TextFieldProps extends FieldTexts, Omit<ComponentProps<"input">, "className" | "id"> {
  /** Shown inside the field, at its right edge. */
  unit?: string;
  figures?: boolean;
}

export function TextField({ label, hint, error, optional, className, unit, figures, ...input }: TextFieldProps) {
  return (
    <Field {...{ label, hint, error, optional, className }}>
      {(control) => (
        <UnitFrame unit={unit}>
          <input
            type="text"
            autoComplete="off"
            {...input}
            {...control}
            className={classNames(controlClasses, unit && "pr-20", figures && "figures")}
          />
        </UnitFrame>
      )}
    </Field>
  );
}

/** Lays the unit over the right end of the control inside it. */
export function UnitFrame({ unit, children }: { unit: string | undefined; children: React.ReactNode }) {
  if (!unit) return children;
  return (
    <div className="relative">
      {children}
      <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-sm text-muted">
        {unit}
      </span>
    </div>
  );
}

export interface TextAreaFieldProps extends FieldTexts, Omit<ComponentProps<"textarea">, "className" | "id"> {}

export function TextAreaField({ label, hint, error, optional, className, rows = 3, ...input }: TextAreaFieldProps) {
  return (
    <Field {...{ label, hint, error, optional, className }}>
      {(control) => <textarea {...input} {...control} rows={rows} className={controlClasses} />}
    </Field>
  );
}
