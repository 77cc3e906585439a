import { QueryClientProvider, useSuspenseQuery } from "@tanstack/react-query";
import { act, render, screen } from "@testing-library/react";
import { Suspense } from "react";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { ApiProblem } from "../../../src/lib/api-problem.ts";
import { createQueryClient } from "../../../src/lib/query-client.ts";
import { NotFoundPage, ProblemPage } from "../../../src/shell/problem-page.tsx";

const load = vi.fn<() => Promise<string>>();

function Page() {
  return <h1>{useSuspenseQuery({ queryKey: ["page"], queryFn: load }).data}</h1>;
}

function open() {
  const page = (
    <Suspense fallback="…">
      <Page />
    </Suspense>
  );
  const router = createMemoryRouter(
    [
      { path: "/page", element: page, errorElement: <ProblemPage /> },
      { path: "*", element: <NotFoundPage /> },
    ],
    { initialEntries: ["/page?tab=history"] },
  );
  render(
    <QueryClientProvider client={createQueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return router;
}

beforeEach(() => {
  vi.useFakeTimers();
  load.mockReset();
});

afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

/** In short steps: within one `act` nothing is drawn anew, so no next wait would begin. */
async function pass(ms: number): Promise<void> {
  for (let left = ms; left > 0; left -= 250) await act(() => vi.advanceTimersByTimeAsync(Math.min(250, left)));
}
const heading = () => screen.getByRole("heading", { level: 1 }).textContent;
/** React reports every error that reaches a boundary; here they are the point. */
const expectReported = () => {
  expect(console.error).toHaveBeenCalled();
  vi.mocked(console.error).mockClear();
};

test("an address that leads nowhere says so", async () => {
  load.mockResolvedValue("Copper");
  const router = open();
  await act(() => router.navigate("/nowhere"));
  expect(heading()).toBe("There is nothing here");
  expect(screen.getByRole("link", { name: "To the first page" })).toBeTruthy();
});

test("a refusal shows its title, its words and the request's number", async () => {
  load.mockRejectedValue(
    new ApiProblem("not-allowed", { title: "Your role does not allow this", status: 403, requestId: "r-77" }),
  );
  open();
  await pass(10);
  expect(heading()).toBe("Your role does not allow this");
  expect(screen.getByText("Ask the owner of your shop if you need this.")).toBeTruthy();
  expect(screen.getByText("Request r-77")).toBeTruthy();
  expectReported();
});

test("an ended session leads to signing in and back here", async () => {
  load.mockRejectedValue(new ApiProblem("not-signed-in", { title: "Sign in first", status: 401 }));
  open();
  await pass(10);
  const link = screen.getByRole("link", { name: "Sign in" });
  expect(link.getAttribute("href")).toBe("/auth/sign-in?returnTo=%2Fpage%3Ftab%3Dhistory");
  expectReported();
});

test("a page comes back by itself when the database answers again", async () => {
  const away = { type: "/problems/database-unavailable", title: "The database does not answer", status: 503 };
  const asked = vi.fn<typeof fetch>(async () => Response.json(away, { status: 503 }));
  vi.stubGlobal("fetch", asked);
  load.mockRejectedValue(new ApiProblem("database-unavailable", away));
  open();
  await pass(2000); // the query's own two retries
  expect(heading()).toBe("The database does not answer.");
  expect(screen.getByText(/Trying again…/)).toBeTruthy();

  await pass(20_000);
  const triesSoFar = asked.mock.calls.length;
  expect(triesSoFar).toBeGreaterThanOrEqual(3);
  expect(triesSoFar).toBeLessThanOrEqual(6); // backs off

  load.mockResolvedValue("Copper 2 mm");
  const session = { user: null, shop: null, admin: false, units: "metric", theme: "system", demo: true };
  asked.mockImplementation(async () => Response.json(session));
  await pass(16_000);
  expect(heading()).toBe("Copper 2 mm");
  expectReported();
});
