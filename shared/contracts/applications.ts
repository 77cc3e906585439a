import { z } from "zod";
import { defineEndpoint, IdParams } from "./endpoint.ts";

export const ApplicationInput = z.object({
  shopName: z.string().trim().min(2, "Give the shop's name").max(80),
  place: z.string().trim().min(2, "Say where the shop is").max(80),
  contactName: z.string().trim().min(2, "Say who you are").max(80),
  email: z.string().trim().toLowerCase().max(254).pipe(z.email("Give an e-mail address such as name@shop.example")),
  machines: z.number().int().min(1, "At least one plasma table is needed").max(99),
  about: z.string().trim().min(10, "A line or two on what you cut").max(2000),
});
export type ApplicationInput = z.infer<typeof ApplicationInput>;

export const Application = ApplicationInput.extend({
  id: z.uuid(),
  state: z.enum(["waiting", "admitted", "declined"]),
  reason: z.string(),
  createdAt: z.iso.datetime(),
  decidedAt: z.iso.datetime().nullable(),
});
export type Application = z.infer<typeof Application>;

export const applyForMembership = defineEndpoint({
  method: "post",
  path: "/api/applications",
  summary: "Ask for membership. The answer is the same whether or not the address has applied before",
  access: "anyone",
  body: ApplicationInput,
  response: z.object({ received: z.literal(true) }),
  status: 201,
});

export const getOwnApplication = defineEndpoint({
  method: "get",
  path: "/api/account/application",
  summary: "What became of the application sent from the signed-in person's e-mail address",
  access: "signed-in",
  response: z.object({
    application: Application.pick({ shopName: true, state: true, reason: true, createdAt: true }).nullable(),
  }),
});

export const listApplications = defineEndpoint({
  method: "get",
  path: "/api/applications",
  summary: "Applications, waiting ones first",
  access: "admin",
  response: z.object({ items: z.array(Application) }),
});

export const admitApplication = defineEndpoint({
  method: "post",
  path: "/api/applications/:id/admission",
  summary: "Admit the shop; its applicant becomes owner when they next sign in with that e-mail address",
  access: "admin",
  params: IdParams,
  response: Application,
  problems: ["not-found", "already-decided", "already-exists"],
});

export const declineApplication = defineEndpoint({
  method: "post",
  path: "/api/applications/:id/refusal",
  summary: "Decline with a reason the applicant will read",
  access: "admin",
  params: IdParams,
  body: z.object({ reason: z.string().trim().min(5, "Give a reason the applicant can use").max(1000) }),
  response: Application,
  problems: ["not-found", "already-decided"],
});
