import { z } from "zod";
import { ApplicationInput } from "#shared/contracts/applications.ts";
import { useProblemForm } from "../../lib/form.ts";
import { DraftNotice, FormProblem } from "../../lib/form-problem.tsx";
import { Button } from "../../ui/button.tsx";
import { TextAreaField, TextField } from "../../ui/text-field.tsx";
import { useApply } from "./applications.queries.ts";

const tables = "A whole number of tables, 1 to 99";
const schema = ApplicationInput.extend({
  machines: z
    .string()
    .trim()
    .regex(/^\d{1,2}$/, tables)
    .transform(Number)
    .pipe(ApplicationInput.shape.machines),
});

export interface ApplicationFormProps {
  /** Whoever is signed in: the decision is looked up by this e-mail address. */
  known?: { name: string; email: string } | null;
  onSent: () => unknown;
}

/** Asks for membership. Works signed out. */
export function ApplicationForm({ known, onSent }: ApplicationFormProps) {
  const apply = useApply();
  const f = useProblemForm({
    id: "application",
    schema,
    defaults: {
      shopName: "",
      place: "",
      contactName: known?.name ?? "",
      email: known?.email ?? "",
      machines: "1",
      about: "",
    },
    submit: async (input, { idempotencyKey }) => {
      await apply.mutateAsync({ input, key: idempotencyKey });
      await onSent();
    },
  });

  return (
    <form onSubmit={f.onSubmit} noValidate className="max-w-lg space-y-5">
      <DraftNotice restored={f.restored} onStartOver={f.startOver} />
      <FormProblem problem={f.problem} />
      <TextField label="Shop" autoComplete="organization" {...f.field("shopName")} />
      <TextField
        label="Where it is"
        hint="Town and country are enough."
        autoComplete="address-level2"
        {...f.field("place")}
      />
      <TextField label="Your name" autoComplete="name" {...f.field("contactName")} />
      <TextField
        label="E-mail address"
        hint="The one you will sign in with: membership hangs on it."
        type="email"
        inputMode="email"
        autoComplete="email"
        spellCheck={false}
        {...f.field("email")}
      />
      <TextField label="CNC plasma tables" inputMode="numeric" figures {...f.field("machines")} />
      <TextAreaField
        label="What the shop cuts"
        hint="Metals, thicknesses, for whom. A few lines; no settings yet."
        rows={4}
        {...f.field("about")}
      />
      <p className="text-sm text-muted">
        Only the network's admins read this. It is used to decide, and never shown to members.
      </p>
      <Button type="submit" kind="primary" pending={f.pending}>
        Send application
      </Button>
    </form>
  );
}
