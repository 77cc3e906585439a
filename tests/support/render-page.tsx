import { QueryClientProvider } from "@tanstack/react-query";
import { render } from "@testing-library/react";
import { Suspense } from "react";
import { createMemoryRouter, type RouteObject, RouterProvider } from "react-router-dom";
import { vi } from "vitest";
import type { Session } from "#shared/contracts/accounts.ts";
import { type ProblemType, problemTypes, problemTypeUri } from "#shared/contracts/problem.ts";
import { createQueryClient } from "../../src/lib/query-client.ts";
import { sessionQuery } from "../../src/shell/session.queries.ts";
import { Toasts } from "../../src/ui/toasts.tsx";

export const testOwner: Session = {
  user: { id: "0b6f0d0e-0000-4000-8000-000000000001", name: "Ode Venn", email: "ode@brackenhold.example" },
  shop: { id: "0b6f0d0e-0000-4000-8000-000000000002", name: "Brackenhold", state: "active", role: "owner" },
  admin: false,
  units: "metric",
  theme: "system",
  demo: false,
};

/** One request as the page made it. */
export interface SentRequest {
  method: string;
  path: string;
  query: URLSearchParams;
  body: unknown;
}

export class Refusal {
  readonly type: ProblemType;
  readonly more: Record<string, unknown>;
  constructor(type: ProblemType, more: Record<string, unknown> = {}) {
    this.type = type;
    this.more = more;
  }
}

/** By "GET /api/recipes": what the server would say, or what makes it up from the request. */
export type Answers = Record<string, unknown | ((request: SentRequest) => unknown)>;

export interface RenderPageOptions {
  routes: RouteObject[];
  at: string;
  answers: Answers;
  session?: Session;
}

/** Renders pages as the product does, with a server made of canned answers; gives every request they made. */
export function renderPage({ routes, at, answers, session = testOwner }: RenderPageOptions) {
  const sent: SentRequest[] = [];
  vi.stubGlobal("fetch", async (url: string, init: RequestInit) => {
    const { pathname: path, searchParams: query } = new URL(url, "http://page.example");
    const method = init.method ?? "GET";
    const request = { method, path, query, body: init.body ? JSON.parse(init.body as string) : undefined };
    sent.push(request);
    const answer = answers[`${method} ${path}`] ?? new Refusal("not-found");
    return respond(typeof answer === "function" ? answer(request) : answer);
  });

  const queries = createQueryClient();
  queries.setQueryData(sessionQuery.queryKey, session);
  const router = createMemoryRouter(
    routes.map((route) => ({ hydrateFallbackElement: null, ...route }) as RouteObject),
    { initialEntries: [at] },
  );
  render(
    <QueryClientProvider client={queries}>
      <Suspense fallback="Waiting">
        <RouterProvider router={router} />
      </Suspense>
      <Toasts />
    </QueryClientProvider>,
  );
  return { sent, router, queries };
}

function respond(answer: unknown): Response {
  if (answer === undefined) return new Response(null, { status: 204 });
  if (!(answer instanceof Refusal)) return Response.json(answer);
  const { title, status } = problemTypes[answer.type];
  return Response.json(
    { type: problemTypeUri(answer.type), title, status, ...answer.more },
    { status, headers: { "Content-Type": "application/problem+json" } },
  );
}
