import { sql } from "drizzle-orm";
import { doublePrecision, integer, jsonb, pgPolicy, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import type { GroupMemory } from "../../../shared/disclosure/ledger.ts";
import { editions } from "./editions.ts";
import { material, processGas } from "./recipe-versions.ts";
import { editionBuilder } from "./roles.ts";

/**
 * What the next edition must know of a group for the three-shop step: the figures last shown, and who stood behind each of
 * them, by opaque number and a keyed digest of what they gave. The builder alone reads it; kept for the last published
 * edition and those not yet decided.
 */
export const editionMemories = pgTable(
  "edition_memories",
  {
    editionId: uuid("edition_id")
      .notNull()
      .references(() => editions.id, { onDelete: "cascade" }),
    groupId: text("group_id").notNull(),
    material: material("material").notNull(),
    processGas: processGas("process_gas").notNull(),
    bandIndex: integer("band_index").notNull(),
    nozzleMm: doublePrecision("nozzle_mm").notNull(),
    memory: jsonb("memory").$type<GroupMemory>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.editionId, t.groupId] }),
    pgPolicy("edition_memories_builder", { for: "all", to: editionBuilder, using: sql`true`, withCheck: sql`true` }),
  ],
);
