import type { z } from "zod";
import type { FieldProblem } from "#shared/contracts/problem.ts";
import { type FieldLimits, fieldLimits, type LimitedField } from "#shared/recipes/limits.ts";
import { limitText } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { ProblemError } from "./problem.ts";

function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}

/** A setpoint out of range is answered with the allowed range in the member's own unit. */
function detailOf(issue: z.core.$ZodIssue, units: UnitSystem): string {
  const limit = fieldLimits[String(issue.path.at(-1)) as LimitedField] as FieldLimits | undefined;
  const outOfRange = issue.code === "too_big" || issue.code === "too_small";
  return limit && outOfRange ? `Allowed: ${limitText(limit.hard, limit.quantity, units)}` : issue.message;
}

/** Parses one part of a request against its contract; a breach is a 400 with a pointer per field. */
export function parsePart<Schema extends z.ZodType>(
  schema: Schema,
  part: "body" | "query",
  value: unknown,
  units: UnitSystem,
): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors: FieldProblem[] = parsed.error.issues.map((issue) => ({
    detail: detailOf(issue, units),
    pointer: part === "body" ? pointerTo(issue.path) : `?${issue.path.map(String).join(".")}`,
  }));
  throw new ProblemError("invalid-request", { errors });
}
