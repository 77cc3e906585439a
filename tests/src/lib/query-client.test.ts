import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { ApiProblem } from "../../../src/lib/api-problem.ts";
import { createQueryClient } from "../../../src/lib/query-client.ts";

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

async function attempts(problem: ApiProblem): Promise<number> {
  const queryFn = vi.fn(() => Promise.reject(problem));
  const outcome = createQueryClient().fetchQuery({ queryKey: ["x"], queryFn });
  const refused = expect(outcome).rejects.toBe(problem);
  await vi.runAllTimersAsync();
  await refused;
  return queryFn.mock.calls.length;
}

test.each([
  [400, 1],
  [403, 1],
  [404, 1],
  [500, 1],
  [0, 3],
  [503, 3],
])("a query refused with status %d is tried %d times before the page says so", async (status, times) => {
  expect(await attempts(new ApiProblem("internal", { title: "Refused", status }))).toBe(times);
});
