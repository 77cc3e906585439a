import { z } from "zod";
import { materials, processGases } from "../materials/materials.ts";
import { PeerGroupKey } from "../peers/peer-group.ts";
import { defineEndpoint, IdParams, Nothing } from "./endpoint.ts";
import { ListedRecipe, NetworkFigures, PeerGroupFigures } from "./released-figures.ts";

/** A published edition as members see it. */
export const PublishedEdition = z.object({
  id: z.uuid(),
  number: z.number().int(),
  date: z.iso.date(),
});
export type PublishedEdition = z.infer<typeof PublishedEdition>;

/** What changed against the edition before: for whoever decides to publish. Group names only, no counts. */
export const EditionChanges = z.object({
  appeared: z.array(PeerGroupKey),
  changed: z.array(PeerGroupKey),
  held: z.array(PeerGroupKey).describe("Old figures kept by the three-shop step"),
  withheld: z.array(PeerGroupKey).describe("Shown before, withheld now"),
  unchanged: z.number().int(),
});
export type EditionChanges = z.infer<typeof EditionChanges>;

export const Edition = PublishedEdition.extend({
  state: z.enum(["built", "published", "discarded"]),
  builtAt: z.iso.datetime(),
  publishedAt: z.iso.datetime().nullable(),
  releasedGroups: z.number().int(),
  changes: EditionChanges,
});
export type Edition = z.infer<typeof Edition>;

export const EditionBuild = z.object({
  id: z.uuid(),
  state: z.enum(["queued", "running", "done", "failed"]),
  groupsDone: z.number().int(),
  groupsTotal: z.number().int().nullable(),
  message: z.string(),
  editionId: z.uuid().nullable(),
  requestedAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
});
export type EditionBuild = z.infer<typeof EditionBuild>;

export const getCurrentEdition = defineEndpoint({
  method: "get",
  path: "/api/editions/current",
  summary: "The newest published edition; null before the first",
  access: "signed-in",
  response: z.object({ edition: PublishedEdition.nullable() }),
});

export const getEditionMaterial = defineEndpoint({
  method: "get",
  path: "/api/editions/:id/materials/:material/:gas",
  summary:
    "Every group an edition shows of one metal and gas, density left out; a group not in the list has too few shops",
  access: "member",
  params: z.object({ id: z.uuid(), material: z.enum(materials), gas: z.enum(processGases) }),
  response: z.object({ edition: PublishedEdition, groups: z.array(PeerGroupFigures), network: NetworkFigures }),
  problems: ["not-found"],
});

export const getEditionGroup = defineEndpoint({
  method: "get",
  path: "/api/editions/:id/groups/:groupId",
  summary: "One peer group with its curves and its listed recipes; withheld with the reason where it is not shown",
  access: "member",
  params: z.object({ id: z.uuid(), groupId: z.string().max(80) }),
  response: z.object({ edition: PublishedEdition, figures: PeerGroupFigures, listed: z.array(ListedRecipe) }),
  problems: ["not-found"],
});

export const listEditions = defineEndpoint({
  method: "get",
  path: "/api/editions",
  summary: "Every edition with what changed, newest first",
  access: "admin",
  response: z.object({ items: z.array(Edition) }),
});

export const startEditionBuild = defineEndpoint({
  method: "post",
  path: "/api/edition-builds",
  summary: "Begin building an edition as a job",
  access: "admin",
  response: EditionBuild,
  status: 202,
  problems: ["build-running"],
});

export const listEditionBuilds = defineEndpoint({
  method: "get",
  path: "/api/edition-builds",
  summary: "The last ten builds with their progress, newest first",
  access: "admin",
  response: z.object({ items: z.array(EditionBuild) }),
});

export const publishEdition = defineEndpoint({
  method: "post",
  path: "/api/editions/:id/publication",
  summary: "Publish a built edition to the members",
  access: "admin",
  params: IdParams,
  response: Edition,
  problems: ["not-found", "wrong-state"],
});

export const discardEdition = defineEndpoint({
  method: "delete",
  path: "/api/editions/:id",
  summary: "Throw away a built edition that was never published",
  access: "admin",
  params: IdParams,
  response: Nothing,
  status: 204,
  problems: ["not-found", "wrong-state"],
});
