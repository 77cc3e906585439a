import { QueryCache, QueryClient } from "@tanstack/react-query";
import { ApiProblem } from "./api-problem.ts";

/** Where the session is kept: shell/session.queries.ts. */
export const sessionKey = ["session"] as const;

const passing = (error: Error) => error instanceof ApiProblem && error.passing;

/** Refusals that say the session is not what this page takes it for. */
const endsSession = (error: Error) =>
  error instanceof ApiProblem && (error.kind === "not-signed-in" || error.kind === "shop-suspended");

/**
 * A refusal stands at once. A passing failure is tried twice more; then the page says so, and keeps trying by itself
 * (problem-page.tsx). A page that already has its figures keeps showing them and asks again every few seconds.
 */
export function createQueryClient(): QueryClient {
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({
      onError: (error) => {
        if (endsSession(error)) void client.invalidateQueries({ queryKey: sessionKey });
      },
    }),
    defaultOptions: {
      queries: {
        retry: (failures, error) => passing(error) && failures < 2,
        retryDelay: (failures) => Math.min(500 * 2 ** failures, 15_000),
        refetchInterval: (query) =>
          query.state.data !== undefined && query.state.error && passing(query.state.error) ? 5000 : false,
        refetchOnWindowFocus: true,
        staleTime: 15_000,
        // The browser's idea of being online is often wrong on a shop floor; asking tells.
        networkMode: "always",
      },
      mutations: { retry: false, networkMode: "always" },
    },
  });
  return client;
}
