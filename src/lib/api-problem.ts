import { type FieldProblem, Problem, type ProblemType, problemTypeOf } from "#shared/contracts/problem.ts";

/** `unreachable`: no answer at all; `unreadable`: an answer that is not of this product. */
export type ProblemKind = ProblemType | "unreachable" | "unreadable";

/** What `call` rejects with: the server's refusal, or that there was no sensible answer. */
export class ApiProblem extends Error {
  override readonly name = "ApiProblem";
  /** HTTP status; 0 when nothing answered. */
  readonly status: number;
  readonly kind: ProblemKind;
  readonly detail: string | undefined;
  readonly errors: readonly FieldProblem[];
  readonly requestId: string | undefined;
  /** What the record says now, where the request was stale. */
  readonly current: unknown;

  constructor(kind: ProblemKind, problem: Omit<Problem, "type">) {
    super(problem.title);
    this.kind = kind;
    this.status = problem.status;
    this.detail = problem.detail;
    this.errors = problem.errors ?? [];
    this.requestId = problem.requestId;
    this.current = problem.current;
  }

  /** The server, its database or the way there is down: worth trying again without the member doing anything. */
  get passing(): boolean {
    return this.status === 0 || this.status === 502 || this.status === 503 || this.status === 504;
  }
}

export const unreachable = () =>
  new ApiProblem("unreachable", { title: "The server does not answer. Check the network", status: 0 });

const unreadable = (status: number, requestId: string | undefined) =>
  new ApiProblem("unreadable", {
    title: "The answer does not make sense to this page. Reload it",
    status,
    ...(requestId === undefined ? {} : { requestId }),
  });

/** Reads a refusal from the wire, and makes one where something in between answered instead. */
export async function readProblem(response: Response): Promise<ApiProblem> {
  const requestId = response.headers.get("X-Request-Id") ?? undefined;
  const parsed = Problem.safeParse(await response.json().catch(() => undefined));
  if (!parsed.success) return unreadable(response.status, requestId);
  const kind = problemTypeOf(parsed.data) ?? "unreadable";
  return new ApiProblem(kind, { ...parsed.data, requestId: parsed.data.requestId ?? requestId });
}

/** An answer that the contract does not allow: an old page meeting a new server, most likely. */
export const misread = (response: Response) =>
  unreadable(response.status, response.headers.get("X-Request-Id") ?? undefined);
