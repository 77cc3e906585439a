import { z } from "zod";
import { defineEndpoint, IdParams } from "./endpoint.ts";

/** A member shop as an admin sees it: how much it shares, never what or which. */
export const Member = z.object({
  id: z.uuid(),
  name: z.string(),
  place: z.string(),
  state: z.enum(["active", "suspended"]),
  stateReason: z.string(),
  joinedAt: z.iso.datetime(),
  people: z.number().int(),
  machines: z.number().int(),
  sharedRecipes: z.number().int(),
});
export type Member = z.infer<typeof Member>;

export const listMembers = defineEndpoint({
  method: "get",
  path: "/api/members",
  summary: "Member shops by name",
  access: "admin",
  query: z.object({
    search: z.string().trim().max(100).optional(),
    state: z.enum(["active", "suspended"]).optional(),
  }),
  response: z.object({ items: z.array(Member) }),
});

export const suspendMember = defineEndpoint({
  method: "post",
  path: "/api/members/:id/suspension",
  summary: "Suspend a shop: its sessions end at once, its contributions leave the next edition",
  access: "admin",
  params: IdParams,
  body: z.object({ reason: z.string().trim().min(5, "Give the reason").max(1000) }),
  response: Member,
  problems: ["not-found", "wrong-state"],
});

export const reinstateMember = defineEndpoint({
  method: "delete",
  path: "/api/members/:id/suspension",
  summary: "Take a suspended shop back",
  access: "admin",
  params: IdParams,
  response: Member,
  problems: ["not-found", "wrong-state"],
});
