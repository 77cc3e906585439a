import { type ReactNode, useState } from "react";
import { type Control, type FieldPath, useWatch } from "react-hook-form";
import type { TestCutInput } from "#shared/contracts/test-cuts.ts";
import { perpendicularityRange, type QualityRange, roughnessRange } from "#shared/cut-quality/iso9013.ts";
import { formatNumber, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import type { ProblemForm } from "../../lib/form.ts";
import { FormQuantity } from "../../lib/form-quantity.tsx";
import { reading, readQuantity } from "../../lib/quantity-text.ts";
import type { QuantityReading } from "../../ui/quantity-field.tsx";
import {
  bevelRule,
  measuredRules,
  type PlainRule,
  readPlain,
  rz5Rule,
  type TestCutFormValues,
} from "./test-cut-form-values.ts";
import { rangeWords } from "./test-cut-words.ts";

export interface MeasuredFieldsProps {
  control: Control<TestCutFormValues, unknown, TestCutInput>;
  field: (name: FieldPath<TestCutFormValues>) => ReturnType<ProblemForm<TestCutFormValues, TestCutInput>["field"]>;
  units: UnitSystem;
  /** ISO 9013 limits grow with the thickness. */
  thicknessMm: number;
}

const measured = ["bevelDeg", "kerfWidthMm", "uMm", "rz5Um"] as const;

/** What was measured, folded away: most cuts are judged by eye. Opens by itself where something is typed or wrong. */
export function MeasuredFields({ control, field, units, thicknessMm }: MeasuredFieldsProps) {
  const typed = useWatch({ control, name: measured }).some((text) => text !== "");
  const wrong = measured.some((name) => field(name).error);
  const rules = measuredRules(units);
  const length = unitLabel("length", units);
  return (
    <Folded open={typed || wrong}>
      <FormQuantity
        control={control}
        name="kerfWidthMm"
        label="Kerf width"
        optional
        unit={length}
        read={reading(rules.kerf)}
      />
      <FormQuantity
        control={control}
        name="bevelDeg"
        label="Bevel"
        hint="Above 0 where the top is narrower."
        optional
        unit="°"
        read={plainReading(bevelRule)}
      />
      <FormQuantity
        control={control}
        name="uMm"
        label="u, out of square"
        hint="Perpendicularity or angularity, ISO 9013."
        optional
        unit={length}
        read={(text) => {
          const read = readQuantity(text, rules.u);
          return withRange(reading(rules.u)(text), read.ok ? perpendicularityRange(read.value, thicknessMm) : null);
        }}
      />
      <FormQuantity
        control={control}
        name="rz5Um"
        label="Rz5, roughness"
        hint="Mean height of the profile, ISO 9013."
        optional
        unit="µm"
        read={(text) => {
          const read = readPlain(text, rz5Rule);
          const value = read.ok ? read.value : null;
          return withRange(plainReading(rz5Rule)(text), value === null ? null : roughnessRange(value, thicknessMm));
        }}
      />
    </Folded>
  );
}

function Folded({ open, children }: { open: boolean; children: ReactNode }) {
  // Stays open once opened: emptying a field to type it anew must not take it away.
  const [opened, setOpened] = useState(open);
  return (
    <details
      open={open || opened}
      onToggle={(event) => setOpened(event.currentTarget.open)}
      className="rounded border border-line-strong bg-surface"
    >
      <summary className="flex min-h-touch items-center px-4 font-bold text-action">
        Add what you measured<span className="font-normal text-muted">&nbsp;(optional)</span>
      </summary>
      <div className="grid gap-5 px-4 pt-2 pb-4 sm:grid-cols-2">{children}</div>
    </details>
  );
}

function plainReading(rule: PlainRule): (text: string) => QuantityReading {
  return (text) => {
    const read = readPlain(text, rule);
    if (!read.ok) return read;
    const space = rule.unit === "°" ? "" : " ";
    return { ok: true, text: read.value === null ? "" : `${formatNumber(read.value, 2)}${space}${rule.unit}` };
  };
}

const withRange = (read: QuantityReading, range: QualityRange | null): QuantityReading =>
  read.ok && range !== null ? { ok: true, text: `${read.text}: ISO 9013 ${rangeWords(range)}` } : read;
