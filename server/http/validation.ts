import type { z } from "zod";
import type { FieldProblem } from "#shared/contracts/problem.ts";
import { ProblemError } from "./problem.ts";

function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}

/** Parses one part of a request against its contract; a breach is a 400 with a pointer per field. */
export function parsePart<Schema extends z.ZodType>(
  schema: Schema,
  part: "body" | "query",
  value: unknown,
  _units: "metric" | "inch",
): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors: FieldProblem[] = parsed.error.issues.map((issue) => ({
    detail: issue.message,
    pointer: part === "body" ? pointerTo(issue.path) : `?${issue.path.map(String).join(".")}`,
  }));
  throw new ProblemError("invalid-request", { errors });
}
