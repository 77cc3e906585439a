import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from "@tanstack/react-query";
import { changePreferences, getSession, type Session, signOut } from "#shared/contracts/accounts.ts";
import { call } from "../lib/api.ts";
import { dropAllDrafts, dropDraftsOfOthers } from "../lib/draft.ts";
import { sessionKey } from "../lib/query-client.ts";
import { showToast } from "../ui/toast-store.ts";

/** What decides which pages a person may read. */
const rightsOf = ({ user, shop, admin }: Session) =>
  JSON.stringify([user?.id, shop?.id, shop?.state, shop?.role, admin]);

/**
 * Who is signed in. Where that is no longer who it was (signed out in another tab, suspended, another person), everything
 * this tab holds was for somebody else: it is dropped, and what is on the screen is asked for again.
 */
export const sessionQuery = queryOptions({
  queryKey: sessionKey,
  queryFn: async ({ signal, client }) => {
    const before = client.getQueryData<Session>(sessionKey);
    const now = await call(getSession, {}, signal);
    if (now.user) dropDraftsOfOthers(now.user.id);
    if (before && rightsOf(before) !== rightsOf(now)) {
      void client.resetQueries({ predicate: ({ queryKey }) => queryKey[0] !== sessionKey[0] });
    }
    return now;
  },
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
