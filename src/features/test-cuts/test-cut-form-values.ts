import { z } from "zod";
import { drossAmounts, type TestCutInput, topEdges } from "#shared/contracts/test-cuts.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { optionalQuantityText, type QuantityRule } from "../../lib/quantity-text.ts";

/** Allowed kerf width and u, in stored units, as the contract has them. */
export function measuredRules(units: UnitSystem) {
  return {
    kerf: { quantity: "length", units, range: { min: 0.3, max: 6 } },
    u: { quantity: "length", units, range: { min: 0, max: 20 } },
  } as const satisfies Record<string, QuantityRule>;
}

export interface PlainRule {
  min: number;
  max: number;
  unit: string;
}

/** Read the same by members of both unit systems. */
export const bevelRule: PlainRule = { min: -45, max: 45, unit: "°" };
export const rz5Rule: PlainRule = { min: 0, max: 2000, unit: "µm" };

type PlainReading = { ok: true; value: number | null } | { ok: false; problem: string };

/** A plain number with a comma or a point, its unit allowed behind it; nothing typed is null. */
export function readPlain(text: string, { min, max, unit }: PlainRule): PlainReading {
  const typed = text
    .trim()
    .replace("−", "-")
    .replace(/\s*(°|deg|µm|μm|um)$/i, "");
  if (typed === "") return { ok: true, value: null };
  const value = /^[-+]?\d+([.,]\d+)?$/.test(typed) ? Number(typed.replace(",", ".")) : Number.NaN;
  if (value >= min && value <= max) return { ok: true, value };
  return { ok: false, problem: `Allowed: ${min} to ${max.toLocaleString("en")} ${unit}` };
}

const plainText = (rule: PlainRule) =>
  z.string().transform((text, context) => {
    const read = readPlain(text, rule);
    if (read.ok) return read.value;
    context.addIssue({ code: "custom", message: read.problem });
    return z.NEVER;
  });

const yesOrNo = (question: string) =>
  z.string().transform((text, context) => {
    if (text === "yes" || text === "no") return text === "yes";
    context.addIssue({ code: "custom", message: question });
    return z.NEVER;
  });

const oneOf = <Value extends string>(values: readonly Value[], question: string) =>
  z.string().transform((text, context) => {
    const found = values.find((value) => value === text);
    if (found !== undefined) return found;
    context.addIssue({ code: "custom", message: question });
    return z.NEVER;
  });

/** As a browser's date-and-time field holds it, in the time zone of the device. */
const localInstant = z.string().transform((text, context) => {
  const date = new Date(text);
  if (text !== "" && !Number.isNaN(date.getTime())) return date.toISOString();
  context.addIssue({ code: "custom", message: "Give day and time" });
  return z.NEVER;
});

export interface TestCutFormValues {
  versionNumber: string;
  cutAt: string;
  cutThrough: string;
  dross: string;
  topEdge: string;
  acceptable: string;
  bevelDeg: string;
  kerfWidthMm: string;
  uMm: string;
  rz5Um: string;
  note: string;
}

export function testCutFormSchema(units: UnitSystem): z.ZodType<TestCutInput, TestCutFormValues> {
  const rules = measuredRules(units);
  return z.object({
    versionNumber: z.string().transform(Number),
    cutAt: localInstant,
    cutThrough: yesOrNo("Did it cut through?"),
    dross: oneOf(drossAmounts, "How much dross?"),
    topEdge: oneOf(topEdges, "How does the top edge look?"),
    acceptable: yesOrNo("Would you hand this part over?"),
    bevelDeg: plainText(bevelRule),
    kerfWidthMm: optionalQuantityText(rules.kerf),
    uMm: optionalQuantityText(rules.u),
    rz5Um: plainText(rz5Rule),
    note: z.string().trim().max(2000, "Keep it under 2,000 letters"),
  });
}

/** Nothing that is judged is chosen beforehand: a tap too few must not become a finding. */
export function emptyTestCut(version: number, now: Date): TestCutFormValues {
  return {
    versionNumber: String(version),
    cutAt: localText(now),
    cutThrough: "",
    dross: "",
    topEdge: "",
    acceptable: "",
    bevelDeg: "",
    kerfWidthMm: "",
    uMm: "",
    rz5Um: "",
    note: "",
  };
}

/** "2026-11-01T14:05" where the device is. */
function localText(date: Date): string {
  return new Date(date.getTime() - date.getTimezoneOffset() * 60_000).toISOString().slice(0, 16);
}
