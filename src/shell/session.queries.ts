import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from "@tanstack/react-query";
import { changePreferences, getSession, type Session, signOut } from "#shared/contracts/accounts.ts";
import { call } from "../lib/api.ts";
import { dropAllDrafts } from "../lib/draft.ts";
import { showToast } from "../ui/toast-store.ts";

export const sessionQuery = queryOptions({
  queryKey: ["session"],
  queryFn: ({ signal }) => call(getSession, {}, signal),
  staleTime: 60_000,
});

/** Who is signed in, in which units they read and write. */
export function useSession(): Session {
  return useSuspenseQuery(sessionQuery).data;
}

/** Shown at once, sent behind; a refusal puts the old choice back and says so. */
export function usePreferences() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (body: Partial<Pick<Session, "units" | "theme">>) => call(changePreferences, { body }),
    onMutate: async (patch) => {
      await queries.cancelQueries(sessionQuery);
      const before = queries.getQueryData(sessionQuery.queryKey);
      if (before) queries.setQueryData(sessionQuery.queryKey, { ...before, ...patch });
      return before;
    },
    onError: (error, _, before) => {
      queries.setQueryData(sessionQuery.queryKey, before);
      showToast(`The choice was not saved. ${error.message}`, { kind: "stop" });
    },
  });
}

/** Leaves nothing of this person on the screen or in the tab, then ends the session at the provider. */
export function useSignOut() {
  return useMutation({
    mutationFn: () => call(signOut, {}),
    onSuccess: ({ continueAt }) => {
      dropAllDrafts();
      window.location.assign(continueAt);
    },
    onError: (error) => showToast(`You are still signed in. ${error.message}`, { kind: "stop" }),
  });
}
