import { queryOptions, skipToken, useQuery } from "@tanstack/react-query";
import { getCurrentEdition, getEditionGroup, getEditionMaterial } from "#shared/contracts/editions.ts";
import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import type { Material, ProcessGas } from "#shared/materials/materials.ts";
import { type PeerGroupSubject, peerGroupId, peerGroupOf } from "#shared/peers/peer-group.ts";
import { call } from "./api.ts";

/** The newest published edition. A new one is noticed within some minutes, not at once: nothing hangs on it. */
export const currentEditionQuery = queryOptions({
  queryKey: ["editions", "current"],
  queryFn: ({ signal }) => call(getCurrentEdition, {}, signal),
  staleTime: 5 * 60_000,
});

/** Every shown group of one metal and gas, without curves. An edition never changes, so it is fetched once. */
export const editionMaterialQuery = (id: string | undefined, material: Material, gas: ProcessGas) =>
  queryOptions({
    queryKey: ["editions", id, "materials", material, gas],
    queryFn: id ? ({ signal }) => call(getEditionMaterial, { params: { id, material, gas } }, signal) : skipToken,
    staleTime: Number.POSITIVE_INFINITY,
  });

/** One group with its curves and listed recipes. */
export const editionGroupQuery = (id: string | undefined, groupId: string) =>
  queryOptions({
    queryKey: ["editions", id, "groups", groupId],
    queryFn: id ? ({ signal }) => call(getEditionGroup, { params: { id, groupId } }, signal) : skipToken,
    staleTime: Number.POSITIVE_INFINITY,
  });

export interface SubjectFigures {
  /** Undefined while on its way, or before the first edition. */
  figures: PeerGroupFigures | undefined;
  groupId: string;
}

/** What the newest edition says of the group a recipe belongs to. A group that is not in it has too few shops. */
export function useGroupFigures(subject: PeerGroupSubject): SubjectFigures {
  const edition = useQuery(currentEditionQuery).data?.edition;
  const { data } = useQuery(editionMaterialQuery(edition?.id, subject.material, subject.gas));
  const key = peerGroupOf(subject);
  const groupId = peerGroupId(key);
  if (!data) return { figures: undefined, groupId };
  const found = data.groups.find((group) => peerGroupId(group.key) === groupId);
  return { figures: found ?? { status: "withheld", key, reason: "quorum" }, groupId };
}
