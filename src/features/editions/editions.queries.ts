import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  discardEdition,
  type EditionBuild,
  listEditionBuilds,
  listEditions,
  publishEdition,
  startEditionBuild,
} from "#shared/contracts/editions.ts";
import { call } from "../../lib/api.ts";

/** Every edition, as those who publish them see it. Apart from what members read of the published ones. */
export const allEditionsQuery = queryOptions({
  queryKey: ["network", "editions"],
  queryFn: ({ signal }) => call(listEditions, {}, signal),
});

const pollMs = 1000;

export const isOpen = (build: EditionBuild | undefined) => build?.state === "queued" || build?.state === "running";

/** The newest build first; asked for again every second while one is under way, also while the server is away. */
export const buildsQuery = queryOptions({
  queryKey: ["network", "edition-builds"],
  queryFn: ({ signal }) => call(listEditionBuilds, {}, signal),
  refetchInterval: ({ state }) => (isOpen(state.data?.items[0]) || state.error ? pollMs : false),
});

export function useStartBuild() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(startEditionBuild, {}),
    // Refused because one is running already: then that one is what there is to see.
    onSettled: () => queries.invalidateQueries({ queryKey: buildsQuery.queryKey }),
  });
}

export function usePublish(id: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(publishEdition, { params: { id } }),
    // Not waited for: the dialog closes itself before the edition it stands in moves down the page.
    onSettled: () => {
      void queries.invalidateQueries({ queryKey: allEditionsQuery.queryKey });
      void queries.invalidateQueries({ queryKey: ["editions"] });
    },
  });
}

export function useDiscard(id: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(discardEdition, { params: { id } }),
    onSettled: () => void queries.invalidateQueries({ queryKey: allEditionsQuery.queryKey }),
  });
}
