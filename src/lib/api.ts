import type { z } from "zod";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { misread, readProblem, unreachable } from "./api-problem.ts";
import { randomKey } from "./random-key.ts";

type Input<Schema extends z.ZodType> = z.input<Schema>;
type Part<Name extends string, Schema extends z.ZodType> =
  Record<never, never> extends Input<Schema> ? { [name in Name]?: Input<Schema> } : { [name in Name]: Input<Schema> };

/** What a call of this endpoint must say; parts of the request that may be empty may be left out. */
export type CallInput<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> = Part<"params", P> &
  Part<"query", Q> &
  Part<"body", B> & { idempotencyKey?: string };

interface LooseInput {
  params?: unknown;
  query?: unknown;
  body?: unknown;
  idempotencyKey?: string;
}

/**
 * Calls one endpoint of the contract and gives its parsed answer.
 * @throws ApiProblem for every refusal; an aborted call rejects with the signal's reason
 */
export async function call<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  input: NoInfer<CallInput<P, Q, B>>,
  signal?: AbortSignal,
): Promise<z.output<R>> {
  const loose = input as LooseInput;
  const response = await send(endpoint, loose, signal);
  if (!response.ok) throw await readProblem(response);
  if (endpoint.mediaType !== "application/json") return (await response.text()) as z.output<R>;

  const text = await response.text();
  const answer = endpoint.response.safeParse(text === "" ? undefined : parseJson(text));
  if (!answer.success) throw misread(response);
  return answer.data;
}

/** Where an endpoint is: for links to files, and for requests that a form or an image makes. */
export function urlOf(endpoint: Pick<Endpoint, "path">, input: { params?: unknown; query?: unknown } = {}): string {
  const params = (input.params ?? {}) as Record<string, unknown>;
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const query = queryString((input.query ?? {}) as Record<string, unknown>);
  return query === "" ? path : `${path}?${query}`;
}

async function send(endpoint: Endpoint, input: LooseInput, signal: AbortSignal | undefined): Promise<Response> {
  const headers: Record<string, string> = { Accept: "application/json, application/problem+json", "X-Tempermark": "1" };
  if (endpoint.method === "post") headers["Idempotency-Key"] = input.idempotencyKey ?? randomKey();
  if (input.body !== undefined) headers["Content-Type"] = "application/json";
  try {
    return await fetch(urlOf(endpoint, input), {
      method: endpoint.method.toUpperCase(),
      headers,
      credentials: "same-origin",
      ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
      ...(signal ? { signal } : {}),
    });
  } catch (error) {
    signal?.throwIfAborted();
    throw error instanceof TypeError ? unreachable() : error;
  }
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined; // refused by the contract, like any other wrong answer
  }
}

function queryString(query: Record<string, unknown>): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    for (const one of Array.isArray(value) ? value : [value]) {
      if (one !== undefined && one !== null && one !== "") search.append(name, String(one));
    }
  }
  return search.toString();
}
