import { queryOptions } from "@tanstack/react-query";
import { listMachines } from "#shared/contracts/machines.ts";
import { call } from "./api.ts";

/** The shop's machines: for their own pages, and wherever a recipe says which one it is for. */
export const machinesQuery = queryOptions({
  queryKey: ["machines"],
  queryFn: ({ signal }) => call(listMachines, {}, signal),
});
