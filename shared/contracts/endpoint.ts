import { z } from "zod";
import type { ProblemType } from "./problem.ts";

export type Method = "get" | "post" | "put" | "patch" | "delete";

/**
 * Who may call: anybody; anybody signed in; people of an active shop and network admins; people of an active shop;
 * only its owners; only network admins.
 */
export type Access = "anyone" | "signed-in" | "member" | "operator" | "owner" | "admin";

export const NoInput = z.object({});
type NoInput = typeof NoInput;

export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
  Who extends Access = Access,
> {
  method: Method;
  /** Express path, `:name` for parameters. */
  path: string;
  summary: string;
  access: Who;
  params: Params;
  query: Query;
  body: Body;
  response: Response;
  /** 200 unless said: 201 for something made, 202 for something begun, 204 for nothing to say. */
  status: 200 | 201 | 202 | 204;
  /** What the body is on the wire. Anything but JSON is a file the browser saves. */
  mediaType: "application/json" | "text/csv";
  /** Every refusal a caller must handle beyond those any endpoint may give. */
  problems: readonly ProblemType[];
}

interface EndpointInput<
  R extends z.ZodType,
  A extends Access,
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
> {
  method: Method;
  path: string;
  summary: string;
  access: A;
  params?: P;
  query?: Q;
  body?: B;
  response: R;
  status?: Endpoint["status"];
  mediaType?: Endpoint["mediaType"];
  problems?: readonly ProblemType[];
}

/** One endpoint, written once: the server parses with it, the client calls by it, the OpenAPI document lists it. */
export function defineEndpoint<
  R extends z.ZodType,
  A extends Access,
  P extends z.ZodType = NoInput,
  Q extends z.ZodType = NoInput,
  B extends z.ZodType = NoInput,
>(input: EndpointInput<R, A, P, Q, B>): Endpoint<P, Q, B, R, A> {
  return {
    status: 200,
    mediaType: "application/json",
    problems: [],
    ...input,
    params: (input.params ?? NoInput) as P,
    query: (input.query ?? NoInput) as Q,
    body: (input.body ?? NoInput) as B,
  };
}

export const Nothing = z.void();

/** Parameters of a path that names one record. */
export const IdParams = z.object({ id: z.uuid() });

/** A page of a list. `next` goes into the query's `cursor` for the following page; null at the end. */
export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.object({ items: z.array(item), next: z.string().nullable(), total: z.number().int() });
}

export const PageQuery = z.object({
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});
