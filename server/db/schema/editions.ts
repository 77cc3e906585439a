import { sql } from "drizzle-orm";
import { integer, jsonb, pgEnum, pgPolicy, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { actorUserId, adminMay, editionBuilder, web } from "./roles.ts";
import { users } from "./users.ts";

export const editionState = pgEnum("edition_state", ["built", "published", "discarded"]);

/** One dated release of all distributions. A trigger refuses any change of what a published one says. */
export const editions = pgTable(
  "editions",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    number: integer("number").notNull().unique(),
    state: editionState("state").notNull().default("built"),
    /** SHA-256 over everything released: the ETag. */
    digest: text("digest").notNull(),
    /** The disclosure parameters it was built under, and the network figures released with it. */
    parameters: jsonb("parameters").notNull(),
    networkFigures: jsonb("network_figures").notNull(),
    /** What changed against the edition before, for whoever decides to publish. */
    changes: jsonb("changes").notNull(),
    /** How many groups it shows. */
    releasedGroups: integer("released_groups").notNull().default(0),
    builtAt: timestamp("built_at", { withTimezone: true }).notNull().defaultNow(),
    publishedAt: timestamp("published_at", { withTimezone: true }),
    publishedBy: uuid("published_by").references(() => users.id, { onDelete: "set null" }),
  },
  () => [
    pgPolicy("editions_published", {
      for: "select",
      to: web,
      using: sql`state = 'published' and ${actorUserId} is not null`,
    }),
    adminMay("editions", "select"),
    adminMay("editions", "update"),
    pgPolicy("editions_builder", { for: "all", to: editionBuilder, using: sql`true`, withCheck: sql`true` }),
  ],
);
