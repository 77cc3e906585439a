import { z } from "zod";

/** Every refusal the product knows: its status and title on the wire (RFC 9457). The one table of problem types. */
export const problemTypes = {
  "invalid-request": { status: 400, title: "Something in the request is not right" },
  "not-signed-in": { status: 401, title: "Sign in first" },
  "origin-refused": { status: 403, title: "The request did not come from this site" },
  "not-allowed": { status: 403, title: "Your role does not allow this" },
  "shop-suspended": { status: 403, title: "Your shop is suspended" },
  "not-found": { status: 404, title: "There is nothing here" },
  "stale-version": { status: 409, title: "Somebody changed this meanwhile" },
  "wrong-state": { status: 409, title: "This cannot be done in its present state" },
  "not-proven": { status: 409, title: "Only a proven recipe can be shared" },
  "in-use": { status: 409, title: "Something else still needs this" },
  "build-running": { status: 409, title: "An edition is being built already" },
  "already-decided": { status: 409, title: "This has been decided already" },
  "already-exists": { status: 409, title: "This exists already" },
  "key-reused": { status: 422, title: "This request was sent before with other content" },
  "too-large": { status: 413, title: "This is too large" },
  "too-many-requests": { status: 429, title: "Too many requests. Wait a moment" },
  internal: { status: 500, title: "Something failed on our side" },
  "database-unavailable": { status: 503, title: "The database does not answer" },
  "sign-in-unavailable": { status: 503, title: "The sign-in provider does not answer" },
} as const satisfies Record<string, { status: number; title: string }>;

export type ProblemType = keyof typeof problemTypes;

export const FieldProblem = z.object({
  detail: z.string(),
  pointer: z
    .string()
    .describe("JSON Pointer (RFC 6901) to the field in the request body, or `?name` for a query parameter"),
});
export type FieldProblem = z.infer<typeof FieldProblem>;

/** RFC 9457 problem details. `current` carries what the record says now, where the request was stale. */
export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  errors: z.array(FieldProblem).optional(),
  requestId: z.string().optional(),
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof Problem>;

const typePrefix = "/problems/";

export function problemTypeUri(type: ProblemType): string {
  return `${typePrefix}${type}`;
}

export function problemTypeOf(problem: Pick<Problem, "type">): ProblemType | undefined {
  const name = problem.type.startsWith(typePrefix) ? problem.type.slice(typePrefix.length) : "";
  return name in problemTypes ? (name as ProblemType) : undefined;
}
