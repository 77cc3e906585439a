import { z } from "zod";
import { defineEndpoint, IdParams } from "./endpoint.ts";
import { sharingLevels } from "./recipes.ts";
import { ListedRecipe } from "./released-figures.ts";

/** Longest text an owner may put beside a listed recipe. */
export const publicTextLimit = 280;

/** One fact of the recipe: what others could come to see of it at a level, and what is kept. */
export const SharingPreview = z.object({
  level: z.enum(sharingLevels),
  counts: z.boolean().describe("The setpoints enter the peer group's distributions at the next edition"),
  groupLabel: z.string(),
  listed: ListedRecipe.omit({ id: true })
    .nullable()
    .describe(
      "The nameless copy as an edition would hold it, with every machine trait it could come to show; null unless listed",
    ),
  staysHere: z
    .array(z.object({ what: z.string(), value: z.string() }))
    .describe("What never leaves the shop, with the shop's own values"),
});
export type SharingPreview = z.infer<typeof SharingPreview>;

export const Sharing = z.object({
  level: z.enum(sharingLevels),
  publicText: z.string(),
  /** Why it is not counted now although shared, or null. */
  notCountedBecause: z.enum(["not-proven", "retired", "shop-suspended", "newer-recipe-counts"]).nullable(),
  previews: z.array(SharingPreview).length(3),
});
export type Sharing = z.infer<typeof Sharing>;

export const getSharing = defineEndpoint({
  method: "get",
  path: "/api/recipes/:id/sharing",
  summary: "How a recipe is shared, and what others would see at each level",
  access: "operator",
  params: IdParams,
  response: Sharing,
  problems: ["not-found"],
});

export const SharingInput = z.object({
  level: z.enum(sharingLevels),
  publicText: z.string().trim().max(publicTextLimit).default(""),
});

export const changeSharing = defineEndpoint({
  method: "put",
  path: "/api/recipes/:id/sharing",
  summary: "Share a proven recipe, change its level or withdraw it",
  access: "owner",
  params: IdParams,
  body: SharingInput,
  response: Sharing,
  problems: ["not-found", "not-proven", "wrong-state"],
});

export const previewSharing = defineEndpoint({
  method: "post",
  path: "/api/recipes/:id/sharing-preview",
  summary: "What others would see with this level and text; nothing is kept",
  access: "operator",
  params: IdParams,
  body: SharingInput,
  response: z.object({ preview: SharingPreview, textRefused: z.array(z.string()) }),
  problems: ["not-found"],
});
