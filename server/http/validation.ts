import { z } from "zod";
import type { FieldProblem } from "#shared/contracts/problem.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatNumber, limitText } from "#shared/units/format.ts";
import type { TypedQuantity, UnitSystem } from "#shared/units/units.ts";
import { ProblemError } from "./problem.ts";

/** Fields whose allowed range is said in the member's own unit. */
const quantities: Record<string, TypedQuantity> = {
  ...Object.fromEntries(Object.entries(metricDefinitions).map(([name, { quantity }]) => [name, quantity])),
  thicknessMm: "thickness",
  nozzleMm: "nozzle",
  powerSourceMaxCurrentA: "current",
  torchPressureBar: "pressure",
  topFeedMmMin: "feed",
  uMm: "length",
};

type JsonSchema = {
  minimum?: number;
  maximum?: number;
  properties?: Record<string, JsonSchema>;
  items?: JsonSchema;
  anyOf?: JsonSchema[];
};

/** The range a contract allows for a number, read off the contract itself. */
function rangeAt(schema: z.ZodType, path: readonly PropertyKey[]): { min: number; max: number } | undefined {
  let at = [z.toJSONSchema(schema, { io: "input", unrepresentable: "any" }) as JsonSchema];
  const unfold = (found: JsonSchema[]): JsonSchema[] => found.flatMap((one) => [one, ...unfold(one.anyOf ?? [])]);
  for (const part of path) {
    at = unfold(at).flatMap((one) => (typeof part === "number" ? one.items : one.properties?.[String(part)]) ?? []);
  }
  const { minimum, maximum } = unfold(at).find((one) => one.minimum !== undefined && one.maximum !== undefined) ?? {};
  return minimum === undefined || maximum === undefined ? undefined : { min: minimum, max: maximum };
}

function detailOf(schema: z.ZodType, issue: z.core.$ZodIssue, units: UnitSystem): string {
  const ofNumber = (issue.code === "too_big" || issue.code === "too_small") && issue.origin === "number";
  const range = ofNumber ? rangeAt(schema, issue.path) : undefined;
  if (!range) return issue.message;
  const quantity = quantities[String(issue.path.at(-1))];
  const plain = `${formatNumber(range.min, 6)} to ${formatNumber(range.max, 6)}`;
  return `Allowed: ${quantity ? limitText(range, quantity, units) : plain}`;
}

/** Paths of texts PostgreSQL cannot keep: with a zero character, or half of a surrogate pair. */
function listUnstorable(value: unknown, path: PropertyKey[] = []): PropertyKey[][] {
  if (typeof value === "string") return /[\0]|\p{Surrogate}/u.test(value) ? [path] : [];
  if (typeof value !== "object" || value === null) return [];
  return Object.entries(value).flatMap(([name, inner]) => listUnstorable(inner, [...path, name]));
}

function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}

/** Parses one part of a request against its contract; a breach is a 400 with a pointer per field. */
export function parsePart<Schema extends z.ZodType>(
  schema: Schema,
  part: "body" | "query",
  value: unknown,
  units: UnitSystem,
): z.output<Schema> {
  const at = (path: readonly PropertyKey[]) => (part === "body" ? pointerTo(path) : `?${path.map(String).join(".")}`);
  const refuse = (errors: FieldProblem[]): never => {
    throw new ProblemError("invalid-request", { errors });
  };
  const parsed = schema.safeParse(value);
  if (!parsed.success) {
    return refuse(
      parsed.error.issues.map((issue) => ({ detail: detailOf(schema, issue, units), pointer: at(issue.path) })),
    );
  }
  const unstorable = listUnstorable(parsed.data);
  if (unstorable.length > 0) {
    return refuse(
      unstorable.map((path) => ({ detail: "Contains a character that cannot be kept", pointer: at(path) })),
    );
  }
  return parsed.data;
}
