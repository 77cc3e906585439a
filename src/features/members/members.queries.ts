import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { listMembers, type Member, reinstateMember, suspendMember } from "#shared/contracts/members.ts";
import { call } from "../../lib/api.ts";

export interface MemberFilters {
  search: string;
  /** Empty for any. */
  state: string;
}

/** A state the address bar made up asks for all. */
const stateOf = (text: string) => (text === "active" || text === "suspended" ? text : undefined);

export const membersQuery = ({ search, state }: MemberFilters) =>
  queryOptions({
    queryKey: ["members", search.trim(), state],
    queryFn: ({ signal }) => call(listMembers, { query: { search: search.trim(), state: stateOf(state) } }, signal),
    placeholderData: keepPreviousData,
  });

export function useSuspend({ id }: Member) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ reason, key }: { reason: string; key: string }) =>
      call(suspendMember, { params: { id }, body: { reason }, idempotencyKey: key }),
    onSettled: () => void queries.invalidateQueries({ queryKey: ["members"] }),
  });
}

export function useReinstate({ id }: Member) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(reinstateMember, { params: { id } }),
    onSettled: () => void queries.invalidateQueries({ queryKey: ["members"] }),
  });
}
