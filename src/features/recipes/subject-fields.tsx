import type { FieldPath } from "react-hook-form";
import type { Machine } from "#shared/contracts/machines.ts";
import {
  type Material,
  materialLabels,
  materials,
  processGases,
  processGasLabels,
  surfaceLabels,
  surfaces,
} from "#shared/materials/materials.ts";
import { unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import type { ProblemForm } from "../../lib/form.ts";
import { FormQuantity } from "../../lib/form-quantity.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextField } from "../../ui/text-field.tsx";
import {
  figureReading,
  type RecipeControl,
  type RecipeFormOutput,
  type RecipeFormValues,
} from "./recipe-form-values.ts";

export interface SubjectFieldsProps {
  field: (name: FieldPath<RecipeFormValues>) => ReturnType<ProblemForm<RecipeFormValues, RecipeFormOutput>["field"]>;
  control: RecipeControl;
  machines: readonly Machine[];
  units: UnitSystem;
  material: Material;
}

const choicesOf = <Value extends string>(values: readonly Value[], labels: Record<Value, string>) =>
  values.map((value) => ({ value, label: labels[value] }));

/** What is cut and with what: together it decides whom the recipe is compared with. */
export function SubjectFields({ field, control, machines, units, material }: SubjectFieldsProps) {
  return (
    <fieldset className="space-y-5">
      <legend className="sr-only">What is cut</legend>
      <SelectField
        label="Machine"
        {...(machines.length > 1 ? { none: "Choose the machine" } : {})}
        choices={machines.map(({ id, name }) => ({ value: id, label: name }))}
        {...field("machineId")}
      />
      <div className="grid grid-cols-1 gap-5 md:grid-cols-2">
        <SelectField
          label="Metal"
          hint="Gauges are read by the metal's own system."
          choices={choicesOf(materials, materialLabels)}
          {...field("material")}
        />
        <FormQuantity
          control={control}
          name="thicknessMm"
          label="Thickness"
          hint={units === "inch" ? "A fraction, a gauge or decimals: 1/8, 11 ga, 0.120" : "Any unit: 3, 1/8 in, 11 ga"}
          unit={unitLabel("thickness", units)}
          read={figureReading({ field: "thicknessMm", units, material })}
        />
        <FormQuantity
          control={control}
          name="nozzleMm"
          label="Nozzle orifice"
          hint="As marked on the nozzle."
          unit={unitLabel("nozzle", units)}
          read={figureReading({ field: "nozzleMm", units, material })}
        />
        <SelectField
          label="Gas"
          hint="What blows through the nozzle."
          choices={choicesOf(processGases, processGasLabels)}
          {...field("processGas")}
        />
        <SelectField label="Surface" choices={choicesOf(surfaces, surfaceLabels)} {...field("surface")} />
        <TextField label="Grade" optional placeholder="S235, 304, 5083" {...field("grade")} />
      </div>
    </fieldset>
  );
}
