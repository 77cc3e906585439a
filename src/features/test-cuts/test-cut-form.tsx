import { useMemo, useState } from "react";
import { useWatch } from "react-hook-form";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { drossAmounts, type TestCutInput, topEdgeLabels, topEdges } from "#shared/contracts/test-cuts.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useProblemForm } from "../../lib/form.ts";
import { DraftNotice, FormProblem } from "../../lib/form-problem.tsx";
import { Button } from "../../ui/button.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextAreaField, TextField } from "../../ui/text-field.tsx";
import { ChoiceTiles } from "./choice-tiles.tsx";
import { MeasuredFields } from "./measured-fields.tsx";
import { emptyTestCut, type TestCutFormValues, testCutFormSchema } from "./test-cut-form-values.ts";
import { drossLabels } from "./test-cut-words.ts";

export interface TestCutFormProps {
  recipe: Recipe;
  units: UnitSystem;
  onSave: (cut: TestCutInput, key: string) => Promise<unknown>;
}

const yesNo = [
  { value: "yes", label: "Yes" },
  { value: "no", label: "No" },
];

/** Four taps and done; what was measured can be added where there was time to measure. */
export function TestCutForm({ recipe, units, onSave }: TestCutFormProps) {
  const schema = useMemo(() => testCutFormSchema(units), [units]);
  const [opened] = useState(() => new Date());
  const newest = recipe.version.number;
  const f = useProblemForm<TestCutFormValues, TestCutInput>({
    id: `test-cut:${recipe.id}`,
    schema,
    defaults: emptyTestCut(newest, opened),
    submit: (cut, { idempotencyKey }) => onSave(cut, idempotencyKey),
  });
  const control = f.form.control;
  const wentThrough = useWatch({ control, name: "cutThrough" }) !== "no";
  const versions = Array.from({ length: newest }, (_, i) => String(newest - i));

  return (
    <form onSubmit={f.onSubmit} noValidate aria-label="Test cut" className="max-w-xl space-y-6">
      <DraftNotice restored={f.restored} onStartOver={f.startOver} />
      <FormProblem problem={f.problem} />
      <ChoiceTiles
        label="Cut through?"
        choices={yesNo}
        {...f.field("cutThrough")}
        onChange={(event) => {
          // What did not go through is no part to hand over: answered along with it.
          if (event.target.value === "no") f.form.setValue("acceptable", "no", { shouldDirty: true });
          return f.field("cutThrough").onChange(event);
        }}
      />
      <ChoiceTiles
        label="Dross below"
        choices={drossAmounts.map((value) => ({ value, label: drossLabels[value] }))}
        {...f.field("dross")}
      />
      <ChoiceTiles
        label="Top edge"
        choices={topEdges.map((value) => ({ value, label: topEdgeLabels[value] }))}
        {...f.field("topEdge")}
      />
      <ChoiceTiles
        label="Acceptable?"
        hint={wentThrough ? "Good enough to hand over. An acceptable cut proves the version." : "Not cut through: no."}
        choices={yesNo.map((choice) => ({ ...choice, disabled: choice.value === "yes" && !wentThrough }))}
        {...f.field("acceptable")}
      />
      <MeasuredFields
        control={control}
        field={f.field}
        units={units}
        thicknessMm={recipe.version.content.thicknessMm}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField label="When" type="datetime-local" {...f.field("cutAt")} />
        {newest > 1 ? (
          <SelectField
            label="Cut with"
            choices={versions.map((value) => ({
              value,
              label: value === String(newest) ? `Version ${value}, the newest` : `Version ${value}`,
            }))}
            {...f.field("versionNumber")}
          />
        ) : null}
      </div>
      <TextAreaField label="Note" hint="Stays in the shop." optional rows={2} {...f.field("note")} />
      <Button type="submit" kind="primary" pending={f.pending} className="min-h-14 w-full text-lg">
        Save test cut
      </Button>
    </form>
  );
}
