import { zodResolver } from "@hookform/resolvers/zod";
import { type FormEvent, useEffect, useRef, useState } from "react";
import {
  type DefaultValues,
  type FieldPath,
  type FieldValues,
  get,
  type UseFormReturn,
  useForm,
} from "react-hook-form";
import type { z } from "zod";
import type { ApiProblem } from "./api-problem.ts";
import { dropDraft, keepDraft, readDraft } from "./draft.ts";
import { asProblem, fieldOfPointer } from "./form-problems.ts";
import { randomKey } from "./random-key.ts";

export interface ProblemFormOptions<In extends FieldValues, Out> {
  /** Names the draft: one per record edited, "recipe:new", "machine:4f…". */
  id: string;
  /** From what is typed to what is sent. Its messages appear at the fields. */
  schema: z.ZodType<Out, In>;
  defaults: DefaultValues<In>;
  /** Sends it, and goes on from there. Rejects with ApiProblem. The key is the same while the content is the same. */
  submit: (output: Out, context: { idempotencyKey: string }) => Promise<unknown>;
  /** Asked before anything is sent, about what is allowed but odd; false leaves the form as it is. */
  confirm?: (output: Out) => Promise<boolean>;
  /** Where a field of the request is named otherwise in the form: "/thicknessMm" -> "thickness". */
  fieldNames?: Record<string, FieldPath<In>>;
}

export interface ProblemForm<In extends FieldValues, Out> {
  form: UseFormReturn<In, unknown, Out>;
  /** Props for a field of ui/ that registers itself: name, handlers, ref and error. */
  field: (name: FieldPath<In>) => ReturnType<UseFormReturn<In>["register"]> & { error: string | undefined };
  onSubmit: (event: FormEvent) => void;
  pending: boolean;
  /** A refusal that belongs to no field; show it with <FormProblem>. */
  problem: ApiProblem | undefined;
  /** True when the fields hold what was typed before a reload or an ended session. */
  restored: boolean;
  /** Back to the defaults, and the draft forgotten. */
  startOver: () => void;
}

/** The one way forms work here: validate as the contract does, send once, put refusals at their fields, lose nothing typed. */
export function useProblemForm<In extends FieldValues, Out>(
  options: ProblemFormOptions<In, Out>,
): ProblemForm<In, Out> {
  const { id, schema, defaults, submit, confirm, fieldNames = {} } = options;
  const [draft] = useState(() => readDraft(id));
  const [restored, setRestored] = useState(draft !== undefined);
  const [problem, setProblem] = useState<ApiProblem>();
  const sent = useRef({ content: "", key: "" });
  const form = useForm<In, unknown, Out>({
    // The resolver's types ask for a schema known in full; this one is generic.
    resolver: zodResolver(schema as never) as never,
    defaultValues: { ...defaults, ...draft } as DefaultValues<In>,
    reValidateMode: "onChange",
    shouldFocusError: true,
  });
  useDraft(id, form);

  function place(refusal: ApiProblem): void {
    const unplaced = refusal.errors.filter(({ pointer, detail }) => {
      const name = (fieldNames[pointer] ?? fieldOfPointer(pointer)) as FieldPath<In>;
      if (get(form.getValues(), name) === undefined) return true;
      form.setError(name, { type: "server", message: detail }, { shouldFocus: true });
      return false;
    });
    setProblem(refusal.errors.length === 0 || unplaced.length > 0 ? refusal : undefined);
    focusFirstWrong();
  }

  async function send(output: Out): Promise<void> {
    setProblem(undefined);
    if (confirm && !(await confirm(output))) return;
    const content = JSON.stringify(output);
    if (sent.current.content !== content) sent.current = { content, key: randomKey() };
    try {
      await submit(output, { idempotencyKey: sent.current.key });
      sent.current = { content: "", key: "" };
      dropDraft(id);
      setRestored(false);
    } catch (error) {
      place(asProblem(error));
    }
  }

  return {
    form,
    field: (name) => ({ ...form.register(name), error: messageOf(form, name) }),
    onSubmit: (event) => {
      event.preventDefault();
      if (!form.formState.isSubmitting) void form.handleSubmit(send)(event);
    },
    pending: form.formState.isSubmitting,
    problem,
    restored,
    startOver: () => {
      form.reset(defaults);
      dropDraft(id);
      setRestored(false);
      setProblem(undefined);
    },
  };
}

function messageOf<In extends FieldValues, Out>(form: UseFormReturn<In, unknown, Out>, name: FieldPath<In>) {
  const error = get(form.formState.errors, name) as { message?: string } | undefined;
  return error?.message;
}

/** Keeps what is typed until it is sent. */
function useDraft<In extends FieldValues, Out>(id: string, form: UseFormReturn<In, unknown, Out>): void {
  useEffect(
    () =>
      form.subscribe({
        formState: { values: true, isDirty: true },
        callback: ({ values, isDirty }) => {
          if (isDirty) keepDraft(id, values);
        },
      }),
    [id, form],
  );
}

/** Server refusals come in any order; the eye starts at the top. */
function focusFirstWrong(): void {
  setTimeout(() => document.querySelector<HTMLElement>("form [aria-invalid='true']")?.focus(), 0);
}
