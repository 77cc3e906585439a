import { type ComponentProps, useId } from "react";
import { classNames } from "./class-names.ts";
import { FieldError, type FieldTexts, Optional } from "./field.tsx";
import type { Choice } from "./select-field.tsx";

const boxClasses = "size-5 shrink-0 accent-action mt-0.5";

interface OptionProps extends Omit<ComponentProps<"input">, "className" | "id"> {
  label: React.ReactNode;
  hint?: React.ReactNode;
}

function Option({ label, hint, ...input }: OptionProps) {
  const id = useId();
  return (
    <div className="flex gap-3 py-1 pointer-coarse:min-h-touch pointer-coarse:py-2">
      <input {...input} id={id} aria-describedby={hint ? `${id}-hint` : undefined} className={boxClasses} />
      <div>
        <label htmlFor={id}>{label}</label>
        {hint ? (
          <p id={`${id}-hint`} className="text-sm text-muted">
            {hint}
          </p>
        ) : null}
      </div>
    </div>
  );
}

export interface ChoiceGroupProps
  extends FieldTexts,
    Omit<ComponentProps<"input">, "className" | "id" | "value" | "type"> {
  name: string;
  choices: readonly Choice[];
  /** Radio buttons choose one, checkboxes any number. */
  type: "radio" | "checkbox";
  /** Controlled use; leave out when a form library registers the inputs. */
  value?: string | readonly string[];
  inline?: boolean;
}

/** A question with its few answers in sight. */
export function ChoiceGroup({
  label,
  hint,
  error,
  optional,
  className,
  choices,
  type,
  value,
  inline,
  ...input
}: ChoiceGroupProps) {
  const id = useId();
  const described = [error && `${id}-error`, hint && `${id}-hint`].filter(Boolean).join(" ");
  const chosen = (choice: string) => (typeof value === "string" ? value === choice : value?.includes(choice));

  return (
    <fieldset aria-describedby={described || undefined} className={classNames("space-y-1", className)}>
      <legend className="font-bold">
        {label}
        {optional ? <Optional /> : null}
      </legend>
      {hint ? (
        <p id={`${id}-hint`} className="text-sm text-muted">
          {hint}
        </p>
      ) : null}
      <div className={inline ? "flex flex-wrap gap-x-6" : undefined}>
        {choices.map((choice) => (
          <Option
            key={choice.value}
            {...input}
            type={type}
            value={choice.value}
            label={choice.label}
            hint={choice.hint}
            disabled={choice.disabled}
            aria-invalid={error ? true : undefined}
            {...(value === undefined
              ? {}
              : { checked: chosen(choice.value) === true, onChange: input.onChange ?? ignore })}
          />
        ))}
      </div>
      {error ? <FieldError id={`${id}-error`}>{error}</FieldError> : null}
    </fieldset>
  );
}

const ignore = () => {};
