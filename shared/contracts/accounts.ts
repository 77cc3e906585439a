import { z } from "zod";
import { unitSystems } from "../units/units.ts";
import { defineEndpoint } from "./endpoint.ts";

export const themes = ["system", "light", "dark"] as const;

/** Who is signed in, as the product's own tables know them; nulls for a visitor. */
export const Session = z.object({
  user: z.object({ id: z.uuid(), name: z.string(), email: z.string() }).nullable(),
  shop: z
    .object({
      id: z.uuid(),
      name: z.string(),
      state: z.enum(["active", "suspended"]),
      role: z.enum(["owner", "operator"]),
    })
    .nullable(),
  admin: z.boolean(),
  units: z.enum(unitSystems),
  theme: z.enum(themes),
  demo: z.boolean().describe("Everything here is invented demo data"),
});
export type Session = z.infer<typeof Session>;

export const getSession = defineEndpoint({
  method: "get",
  path: "/api/session",
  summary: "Who is signed in and what they may do",
  access: "anyone",
  response: Session,
});

export const changePreferences = defineEndpoint({
  method: "patch",
  path: "/api/account/preferences",
  summary: "Choose units and theme",
  access: "signed-in",
  body: z.object({ units: z.enum(unitSystems).optional(), theme: z.enum(themes).optional() }),
  response: Session,
});

export const signOut = defineEndpoint({
  method: "post",
  path: "/api/sign-out",
  summary: "End the session here; `continueAt` ends it at the sign-in provider too",
  access: "anyone",
  response: z.object({ continueAt: z.string() }),
});
