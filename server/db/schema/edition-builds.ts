import { sql } from "drizzle-orm";
import { integer, pgEnum, pgPolicy, pgTable, text, timestamp, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { editions } from "./editions.ts";
import { adminMay, editionBuilder } from "./roles.ts";
import { users } from "./users.ts";

export const buildState = pgEnum("build_state", ["queued", "running", "done", "failed"]);

/** The job of building an edition, with its progress; written outside the edition's own transaction so that it shows. */
export const editionBuilds = pgTable(
  "edition_builds",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    state: buildState("state").notNull().default("queued"),
    groupsDone: integer("groups_done").notNull().default(0),
    groupsTotal: integer("groups_total"),
    message: text("message").notNull().default(""),
    editionId: uuid("edition_id").references(() => editions.id, { onDelete: "set null" }),
    requestedBy: uuid("requested_by").references(() => users.id, { onDelete: "set null" }),
    requestedAt: timestamp("requested_at", { withTimezone: true }).notNull().defaultNow(),
    startedAt: timestamp("started_at", { withTimezone: true }),
    finishedAt: timestamp("finished_at", { withTimezone: true }),
  },
  (t) => [
    // One at a time, whoever asks and however many processes there are.
    uniqueIndex("edition_builds_one_open").on(sql`(true)`).where(sql`${t.state} in ('queued', 'running')`),
    adminMay("edition_builds", "select"),
    adminMay("edition_builds", "insert"),
    pgPolicy("edition_builds_builder", { for: "all", to: editionBuilder, using: sql`true`, withCheck: sql`true` }),
  ],
);
