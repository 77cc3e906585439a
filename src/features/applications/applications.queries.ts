import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  type Application,
  type ApplicationInput,
  admitApplication,
  applyForMembership,
  declineApplication,
  getOwnApplication,
  listApplications,
} from "#shared/contracts/applications.ts";
import { call } from "../../lib/api.ts";
import { ApiProblem } from "../../lib/api-problem.ts";

export const applicationsQuery = queryOptions({
  queryKey: ["applications"],
  queryFn: ({ signal }) => call(listApplications, {}, signal),
});

export const ownApplicationQuery = queryOptions({
  queryKey: ["own-application"],
  queryFn: ({ signal }) => call(getOwnApplication, {}, signal),
});

export function useApply() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ input, key }: { input: ApplicationInput; key: string }) =>
      call(applyForMembership, { body: input, idempotencyKey: key }),
    onSuccess: () => queries.removeQueries({ queryKey: ownApplicationQuery.queryKey }),
  });
}

/* Below, the lists are refreshed but not waited for: a dialog closes itself before the row it stands in moves away. */

export function useAdmit() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ id }: Application) => call(admitApplication, { params: { id } }),
    // A refusal means that the list on screen is old, most likely.
    onSettled: () => void queries.invalidateQueries({ queryKey: applicationsQuery.queryKey }),
    onSuccess: () => void queries.invalidateQueries({ queryKey: ["members"] }),
  });
}

export function useDecline() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ application, reason, key }: { application: Application; reason: string; key: string }) =>
      call(declineApplication, { params: { id: application.id }, body: { reason }, idempotencyKey: key }),
    onSettled: () => void queries.invalidateQueries({ queryKey: applicationsQuery.queryKey }),
  });
}

/** Another admin was quicker: nothing is left to decide, and nothing was changed by this one. */
export const isAlreadyDecided = (error: unknown) => error instanceof ApiProblem && error.kind === "already-decided";
