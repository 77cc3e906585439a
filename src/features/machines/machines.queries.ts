import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  createMachine,
  deleteMachine,
  getMachine,
  type Machine,
  type MachineInput,
  updateMachine,
} from "#shared/contracts/machines.ts";
import { call } from "../../lib/api.ts";

export const machineQuery = (id: string) =>
  queryOptions({
    queryKey: ["machines", id],
    queryFn: ({ signal }) => call(getMachine, { params: { id } }, signal),
  });

/** Saves a new machine, or a change of the one given. */
export function useSaveMachine(machine?: Machine) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ input, key }: { input: MachineInput; key: string }) =>
      machine
        ? call(updateMachine, { params: { id: machine.id }, body: { ...input, baseVersion: machine.version } })
        : call(createMachine, { body: input, idempotencyKey: key }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ["machines"] }),
  });
}

export function useDeleteMachine(id: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(deleteMachine, { params: { id } }),
    onSuccess: () => {
      queries.removeQueries({ queryKey: ["machines", id] });
      return queries.invalidateQueries({ queryKey: ["machines"], exact: true });
    },
  });
}
