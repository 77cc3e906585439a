import { useMemo } from "react";
import { z } from "zod";
import {
  drynessLabels,
  drynessLevels,
  heightControlLabels,
  heightControls,
  type Machine,
  MachineInput,
  startMethodLabels,
  startMethods,
} from "#shared/contracts/machines.ts";
import { editText, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useProblemForm } from "../../lib/form.ts";
import { DraftNotice, FormProblem } from "../../lib/form-problem.tsx";
import { FormQuantity } from "../../lib/form-quantity.tsx";
import { optionalQuantityText, quantityText, reading } from "../../lib/quantity-text.ts";
import { Button } from "../../ui/button.tsx";
import { ChoiceGroup } from "../../ui/choice-group.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextAreaField, TextField } from "../../ui/text-field.tsx";

const fieldRules = (units: UnitSystem) =>
  ({
    maxCurrent: { quantity: "current", units, range: { min: 10, max: 400 } },
    pressure: { quantity: "pressure", units, range: { min: 2, max: 9 } },
    topFeed: { quantity: "feed", units, range: { min: 50, max: 100_000 } },
  }) as const;

const sampleRate = z
  .string()
  .trim()
  .transform((text) => (text === "" ? null : Number(text.replace(",", "."))))
  .refine((hz) => hz === null || (hz >= 0.1 && hz <= 100_000), "Allowed: 0.1 to 100,000 readings a second");

function formSchema(units: UnitSystem) {
  const rules = fieldRules(units);
  const { shape } = MachineInput;
  return z.object({
    name: shape.name,
    powerSourceMaxCurrentA: quantityText(rules.maxCurrent),
    startMethod: shape.startMethod,
    torchPressureBar: optionalQuantityText(rules.pressure),
    dryness: shape.dryness,
    heightControl: shape.heightControl,
    heightControlSampleHz: sampleRate,
    topFeedMmMin: quantityText(rules.topFeed),
    note: z.string().trim().max(2000),
  });
}

function defaultsOf(machine: Machine | undefined, units: UnitSystem) {
  if (!machine) {
    return {
      name: "",
      powerSourceMaxCurrentA: "",
      startMethod: "contact" as const,
      torchPressureBar: "",
      dryness: "separator" as const,
      heightControl: "arc-voltage" as const,
      heightControlSampleHz: "",
      topFeedMmMin: "",
      note: "",
    };
  }
  const { name, startMethod, dryness, heightControl, note } = machine;
  return {
    name,
    startMethod,
    dryness,
    heightControl,
    note,
    powerSourceMaxCurrentA: editText(machine.powerSourceMaxCurrentA, "current", units),
    torchPressureBar: machine.torchPressureBar === null ? "" : editText(machine.torchPressureBar, "pressure", units),
    heightControlSampleHz: machine.heightControlSampleHz === null ? "" : String(machine.heightControlSampleHz),
    topFeedMmMin: editText(machine.topFeedMmMin, "feed", units),
  };
}

export interface MachineFormProps {
  units: UnitSystem;
  machine?: Machine;
  onSave: (input: MachineInput, key: string) => Promise<unknown>;
}

/** Describes a machine: what a starting recipe must respect, and nothing that names its makers. */
export function MachineForm({ units, machine, onSave }: MachineFormProps) {
  const schema = useMemo(() => formSchema(units), [units]);
  const rules = fieldRules(units);
  const f = useProblemForm({
    id: `machine:${machine?.id ?? "new"}`,
    schema,
    defaults: defaultsOf(machine, units),
    submit: (input, { idempotencyKey }) => onSave(input, idempotencyKey),
  });
  const control = f.form.control;

  return (
    <form onSubmit={f.onSubmit} noValidate className="max-w-lg space-y-5">
      <DraftNotice restored={f.restored} onStartOver={f.startOver} />
      <FormProblem problem={f.problem} />
      <TextField label="Name" hint="What the shop calls it. No one else sees it." {...f.field("name")} />
      <FormQuantity
        control={control}
        name="powerSourceMaxCurrentA"
        label="Power source, largest current"
        unit="A"
        read={reading(rules.maxCurrent)}
      />
      <ChoiceGroup
        type="radio"
        label="How the arc starts"
        choices={startMethods.map((value) => ({ value, label: startMethodLabels[value] }))}
        {...f.field("startMethod")}
      />
      <FormQuantity
        control={control}
        name="torchPressureBar"
        label="Air pressure at the torch"
        hint="Read while the air flows, at the torch end of the hose."
        optional
        unit={unitLabel("pressure", units)}
        read={reading(rules.pressure)}
      />
      <SelectField
        label="How the air is dried"
        choices={drynessLevels.map((value) => ({ value, label: drynessLabels[value] }))}
        {...f.field("dryness")}
      />
      <SelectField
        label="Height control"
        choices={heightControls.map((value) => ({ value, label: heightControlLabels[value] }))}
        {...f.field("heightControl")}
      />
      <TextField
        label="Height control readings a second"
        optional
        unit="1/s"
        figures
        inputMode="decimal"
        {...f.field("heightControlSampleHz")}
      />
      <FormQuantity
        control={control}
        name="topFeedMmMin"
        label="Top feed"
        hint="The fastest the table cuts without losing the line."
        unit={unitLabel("feed", units)}
        read={reading(rules.topFeed)}
      />
      <TextAreaField
        label="Note to self"
        hint="Stays in the shop. Never shared."
        optional
        rows={3}
        {...f.field("note")}
      />
      <Button type="submit" kind="primary" pending={f.pending}>
        {machine ? "Save changes" : "Keep machine"}
      </Button>
    </form>
  );
}
