import { sql } from "drizzle-orm";
import { doublePrecision, index, integer, jsonb, pgPolicy, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import { editions } from "./editions.ts";
import { material, processGas } from "./recipe-versions.ts";
import { actorUserId, editionBuilder, web } from "./roles.ts";

// Not for admins before it is published either: two builds with one shop suspended between them, subtracted, show its figures.
const readable = sql`${actorUserId} is not null and exists (select 1 from editions e where e.id = edition_id and e.state = 'published')`;

/** What an edition says of one peer group: released figures, or the reason there are none. */
export const editionGroups = pgTable(
  "edition_groups",
  {
    editionId: uuid("edition_id")
      .notNull()
      .references(() => editions.id, { onDelete: "cascade" }),
    groupId: text("group_id").notNull(),
    material: material("material").notNull(),
    processGas: processGas("process_gas").notNull(),
    bandIndex: integer("band_index").notNull(),
    nozzleMm: doublePrecision("nozzle_mm").notNull(),
    figures: jsonb("figures").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.editionId, t.groupId] }),
    index("edition_groups_material").on(t.editionId, t.material, t.processGas),
    pgPolicy("edition_groups_published", { for: "select", to: web, using: readable }),
    pgPolicy("edition_groups_builder", { for: "all", to: editionBuilder, using: sql`true`, withCheck: sql`true` }),
  ],
);

/** Nameless copies. The id is random, made anew for each edition, and leads nowhere. */
export const listedRecipes = pgTable(
  "listed_recipes",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    editionId: uuid("edition_id")
      .notNull()
      .references(() => editions.id, { onDelete: "cascade" }),
    groupId: text("group_id").notNull(),
    recipe: jsonb("recipe").notNull(),
  },
  (t) => [
    index("listed_recipes_group").on(t.editionId, t.groupId),
    pgPolicy("listed_recipes_published", { for: "select", to: web, using: readable }),
    pgPolicy("listed_recipes_builder", { for: "all", to: editionBuilder, using: sql`true`, withCheck: sql`true` }),
  ],
);
