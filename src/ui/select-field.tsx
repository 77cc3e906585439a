import { ChevronDown } from "lucide-react";
import type { ComponentProps } from "react";
import { classNames } from "./class-names.ts";
import { controlClasses, Field, type FieldTexts } from "./field.tsx";

export interface Choice {
  value: string;
  label: string;
  hint?: string;
  disabled?: boolean;
}

export interface SelectFieldProps extends FieldTexts, Omit<ComponentProps<"select">, "className" | "id" | "children"> {
  choices: readonly Choice[];
  /** An empty first choice, in words: "Choose a machine", "Any metal". */
  none?: string;
}

export function SelectField({ label, hint, error, optional, className, choices, none, ...select }: SelectFieldProps) {
  return (
    <Field {...{ label, hint, error, optional, className }}>
      {(control) => (
        <div className="relative">
          <select {...select} {...control} className={classNames(controlClasses, "appearance-none pr-10")}>
            {none === undefined ? null : <option value="">{none}</option>}
            {choices.map((choice) => (
              <option key={choice.value} value={choice.value} disabled={choice.disabled}>
                {choice.label}
              </option>
            ))}
          </select>
          <ChevronDown
            aria-hidden="true"
            size={18}
            className="pointer-events-none absolute inset-y-0 right-3 my-auto text-muted"
          />
        </div>
      )}
    </Field>
  );
}
