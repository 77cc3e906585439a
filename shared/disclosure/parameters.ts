import { z } from "zod";

/** Below this no rule protects anybody: with two shops each reads the other off the figures. */
export const fewestShopsEver = 3;

/**
 * The network's settings for what may leave the server. Counts are distinct shops.
 * The defaults follow the threshold rule of FCSM Statistical Policy Working Paper 22; a network may only tighten them
 * or loosen them down to three.
 */
export const DisclosureParameters = z
  .object({
    quorum: z
      .number()
      .int()
      .min(fewestShopsEver)
      .default(5)
      .describe("Fewest shops a group or metric needs to show anything"),
    tailsFrom: z.number().int().default(10).describe("Fewest shops for p10, p90 and the density"),
    farTailsFrom: z.number().int().default(20).describe("Fewest shops for p5 and p95"),
    changedShops: z.number().int().min(fewestShopsEver).default(3).describe("Fewest changed shops for new figures"),
    heldEditions: z
      .number()
      .int()
      .min(0)
      .max(2)
      .default(2)
      .describe("Editions a withdrawn contribution may stay in held figures"),
    listingShops: z
      .number()
      .int()
      .min(fewestShopsEver)
      .default(3)
      .describe("Fewest shops listing recipes in a group to show any"),
    traitShops: z
      .number()
      .int()
      .min(fewestShopsEver)
      .default(5)
      .describe("Fewest shops sharing a machine trait to show it"),
  })
  .check(
    z.refine((p) => p.tailsFrom >= p.quorum && p.farTailsFrom >= p.tailsFrom, {
      path: ["tailsFrom"],
      error: "Tails need at least as many shops as the quorum, far tails at least as many as tails",
    }),
  );
export type DisclosureParameters = z.infer<typeof DisclosureParameters>;

export const defaultDisclosureParameters: DisclosureParameters = DisclosureParameters.parse({});
