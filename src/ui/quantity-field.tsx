import type { ComponentProps } from "react";
import { classNames } from "./class-names.ts";
import { controlClasses, Field, type FieldTexts } from "./field.tsx";
import { UnitFrame } from "./text-field.tsx";

/** What a typed quantity means: its value written out with a unit, or what is wrong with it. */
export type QuantityReading = { ok: true; text: string } | { ok: false; problem: string };

export interface QuantityFieldProps
  extends FieldTexts,
    Omit<ComponentProps<"input">, "className" | "id" | "value" | "defaultValue" | "onChange" | "type"> {
  value: string;
  onValueChange: (text: string) => void;
  /** The unit that a bare number is taken in. */
  unit: string;
  read: (text: string) => QuantityReading;
}

/** A quantity in whatever unit it was measured: "1/8 in", "11 ga", "3.2". Says below what it understood. */
export function QuantityField(props: QuantityFieldProps) {
  const { label, hint, error, optional, className, value, onValueChange, unit, read, ...input } = props;
  const typed = value.trim();
  const reading = typed === "" ? undefined : read(typed);
  const note = error ? undefined : reading?.ok ? `= ${reading.text}` : reading?.problem;

  return (
    <Field {...{ label, hint, error, optional, className, note }}>
      {(control) => (
        <UnitFrame unit={unit}>
          <input
            autoComplete="off"
            autoCapitalize="none"
            spellCheck={false}
            // A full keyboard, for units, fractions and gauges.
            inputMode="text"
            {...input}
            {...control}
            type="text"
            value={value}
            onChange={(event) => onValueChange(event.target.value)}
            className={classNames(controlClasses, "figures pr-20")}
          />
        </UnitFrame>
      )}
    </Field>
  );
}
