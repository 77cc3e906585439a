import { useId } from "react";
import { classNames } from "./class-names.ts";

export interface SegmentedProps<Value extends string> {
  label: string;
  choices: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
}

/** Two or three short choices side by side; arrow keys move, as in any radio group. */
export function Segmented<Value extends string>({ label, choices, value, onChange }: SegmentedProps<Value>) {
  const name = useId();
  return (
    <fieldset>
      <legend className="text-sm text-muted">{label}</legend>
      <div className="mt-1 flex rounded border border-line-strong">
        {choices.map((choice) => (
          <label
            key={choice.value}
            className={classNames(
              "flex min-h-9 flex-1 cursor-pointer items-center justify-center px-2 text-sm font-bold pointer-coarse:min-h-touch",
              "has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-action",
              choice.value === value ? "bg-action text-on-action" : "text-soft hover:bg-action-soft",
            )}
          >
            <input
              type="radio"
              name={name}
              value={choice.value}
              checked={choice.value === value}
              onChange={() => onChange(choice.value)}
              className="sr-only"
            />
            {choice.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
