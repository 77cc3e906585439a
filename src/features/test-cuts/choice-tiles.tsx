import { type ComponentProps, useId } from "react";
import { classNames } from "../../ui/class-names.ts";
import { FieldError } from "../../ui/field.tsx";

export interface ChoiceTilesProps extends Omit<ComponentProps<"input">, "type" | "className" | "id" | "value"> {
  label: string;
  hint?: string;
  error?: string | undefined;
  choices: readonly { value: string; label: string; disabled?: boolean }[];
}

/** A question answered with one tap of a gloved finger: every answer is a tile. Arrow keys move, as in any radio group. */
export function ChoiceTiles({ label, hint, error, choices, ...input }: ChoiceTilesProps) {
  const id = useId();
  const described = [error && `${id}-error`, hint && `${id}-hint`].filter(Boolean).join(" ");
  return (
    <fieldset aria-describedby={described || undefined}>
      <legend className="font-bold">{label}</legend>
      {hint ? (
        <p id={`${id}-hint`} className="text-sm text-muted">
          {hint}
        </p>
      ) : null}
      <div
        className={classNames("mt-1 grid gap-2", choices.length === 2 ? "grid-cols-2" : "grid-cols-2 sm:grid-cols-4")}
      >
        {choices.map(({ value, label: text, disabled }) => (
          <label
            key={value}
            className={classNames(
              "flex min-h-14 cursor-pointer items-center justify-center rounded border bg-surface px-2 text-center text-lg font-bold",
              "has-checked:border-action has-checked:bg-action has-checked:text-on-action has-disabled:cursor-not-allowed has-disabled:opacity-55",
              "has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-action",
              error ? "border-stop" : "border-line-strong",
            )}
          >
            <input
              {...input}
              type="radio"
              value={value}
              disabled={disabled}
              aria-invalid={error ? true : undefined}
              className="sr-only"
            />
            {text}
          </label>
        ))}
      </div>
      {error ? (
        <div className="mt-1">
          <FieldError id={`${id}-error`}>{error}</FieldError>
        </div>
      ) : null}
    </fieldset>
  );
}
