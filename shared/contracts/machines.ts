import { z } from "zod";
import { defineEndpoint, IdParams, Nothing } from "./endpoint.ts";

export const startMethods = ["high-frequency", "contact"] as const;
export const startMethodLabels: Record<(typeof startMethods)[number], string> = {
  "high-frequency": "High frequency",
  contact: "Contact (no high frequency)",
};

export const drynessLevels = ["untreated", "separator", "refrigerated", "desiccant"] as const;
export const drynessLabels: Record<(typeof drynessLevels)[number], string> = {
  untreated: "Untreated",
  separator: "Water separator",
  refrigerated: "Refrigerated dryer",
  desiccant: "Desiccant dryer",
};

export const heightControls = ["none", "manual", "arc-voltage", "capacitive"] as const;
export const heightControlLabels: Record<(typeof heightControls)[number], string> = {
  none: "None: torch at a fixed height",
  manual: "Moved by hand while cutting",
  "arc-voltage": "Holds the arc voltage",
  capacitive: "Holds the distance (capacitive)",
};

/** What a machine is, as the shop describes it: table, power source, torch and height control as one. */
export const MachineInput = z.object({
  name: z.string().trim().min(1, "Give the machine a name").max(60),
  powerSourceMaxCurrentA: z.number().min(10).max(400),
  startMethod: z.enum(startMethods),
  torchPressureBar: z
    .number()
    .min(2)
    .max(9)
    .nullable()
    .describe("Air pressure available at the torch while it flows, bar gauge"),
  dryness: z.enum(drynessLevels),
  heightControl: z.enum(heightControls),
  heightControlSampleHz: z
    .number()
    .min(0.1)
    .max(100_000)
    .nullable()
    .describe("How often the height control reads the arc voltage"),
  topFeedMmMin: z.number().min(50).max(100_000),
  note: z.string().trim().max(2000).default("").describe("Private to the shop, never shared"),
});
export type MachineInput = z.infer<typeof MachineInput>;

export const Machine = MachineInput.extend({
  id: z.uuid(),
  note: z.string(),
  version: z.number().int(),
  recipes: z.number().int().describe("Recipes kept for it"),
  updatedAt: z.iso.datetime(),
});
export type Machine = z.infer<typeof Machine>;

export const listMachines = defineEndpoint({
  method: "get",
  path: "/api/machines",
  summary: "The shop's machines, by name",
  access: "operator",
  response: z.object({ items: z.array(Machine) }),
});

export const getMachine = defineEndpoint({
  method: "get",
  path: "/api/machines/:id",
  summary: "One machine",
  access: "operator",
  params: IdParams,
  response: Machine,
  problems: ["not-found"],
});

export const createMachine = defineEndpoint({
  method: "post",
  path: "/api/machines",
  summary: "Describe a machine",
  access: "owner",
  body: MachineInput,
  response: Machine,
  status: 201,
  problems: ["already-exists"],
});

export const updateMachine = defineEndpoint({
  method: "put",
  path: "/api/machines/:id",
  summary: "Change a machine's description",
  access: "owner",
  params: IdParams,
  body: MachineInput.extend({ baseVersion: z.number().int() }),
  response: Machine,
  problems: ["not-found", "stale-version", "already-exists"],
});

export const deleteMachine = defineEndpoint({
  method: "delete",
  path: "/api/machines/:id",
  summary: "Remove a machine that no recipe needs",
  access: "owner",
  params: IdParams,
  response: Nothing,
  status: 204,
  problems: ["not-found", "in-use"],
});
