import { type ReactNode, useMemo } from "react";
import { useWatch } from "react-hook-form";
import type { Machine } from "#shared/contracts/machines.ts";
import type { RecipeContent } from "#shared/contracts/recipes.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useProblemForm } from "../../lib/form.ts";
import { DraftNotice, FormProblem } from "../../lib/form-problem.tsx";
import { Button } from "../../ui/button.tsx";
import { TextAreaField, TextField } from "../../ui/text-field.tsx";
import { usePhone } from "../../ui/use-media-query.ts";
import { LiveAside } from "./live-aside.tsx";
import { oddFigures } from "./odd-figures.ts";
import { OddFiguresDialog } from "./odd-figures-dialog.tsx";
import {
  type RecipeFormOutput,
  type RecipeFormValues,
  recipeFieldNames,
  recipeFormSchema,
} from "./recipe-form-values.ts";
import { SetpointFields } from "./setpoint-fields.tsx";
import { SubjectFields } from "./subject-fields.tsx";
import { useQuestion } from "./use-question.ts";

export interface RecipeFormProps {
  /** Names the draft. */
  id: string;
  units: UnitSystem;
  machines: readonly Machine[];
  defaults: RecipeFormValues;
  /** A change asks for its reason, a new recipe does not. */
  isChange?: boolean;
  act: string;
  onSave: (output: RecipeFormOutput, key: string) => Promise<unknown>;
  /** Above the fields: where a copy comes from. */
  children?: ReactNode;
}

/** Writes or changes a recipe; beside it stands what the figures mean while they are typed. */
export function RecipeForm({ id, units, machines, defaults, isChange, act, onSave, children }: RecipeFormProps) {
  const schema = useMemo(() => recipeFormSchema(units), [units]);
  const odd = useQuestion<string[], boolean>();
  const f = useProblemForm<RecipeFormValues, RecipeFormOutput>({
    id,
    schema,
    defaults,
    fieldNames: recipeFieldNames,
    confirm: async ({ content }) => {
      const questions = oddFigures(content, machineOf(machines, content), units);
      return questions.length === 0 || odd.ask(questions);
    },
    submit: (output, { idempotencyKey }) => onSave(output, idempotencyKey),
  });
  const phone = usePhone();
  const control = f.form.control;
  const material = useWatch({ control, name: "material" });

  return (
    <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <form onSubmit={f.onSubmit} noValidate aria-label="Recipe" className="max-w-2xl space-y-5">
        <DraftNotice restored={f.restored} onStartOver={f.startOver} />
        <FormProblem problem={f.problem} />
        {children}
        <SubjectFields field={f.field} control={control} machines={machines} units={units} material={material} />
        <SetpointFields control={control} units={units} material={material} live={phone} />
        {phone ? <LiveAside control={control} units={units} heatOnly /> : null}
        {isChange ? (
          <TextField
            label="Reason for the change"
            hint="A few words for whoever reads the history: new nozzle, less dross, other sheet."
            optional
            {...f.field("reason")}
          />
        ) : null}
        <TextAreaField
          label="Note to self"
          hint="Stays in the shop. Never shared."
          optional
          rows={3}
          {...f.field("note")}
        />
        <Button type="submit" kind="primary" pending={f.pending} className="max-md:w-full">
          {act}
        </Button>
      </form>
      {phone ? null : <LiveAside control={control} units={units} />}
      <OddFiguresDialog questions={odd.asked} onAnswer={odd.answer} />
    </div>
  );
}

const machineOf = (machines: readonly Machine[], content: RecipeContent) =>
  machines.find(({ id }) => id === content.machineId);
