import { sql } from "drizzle-orm";
import { bigint, index, jsonb, pgPolicy, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { actorUserId, adminMay, editionBuilder, web } from "./roles.ts";
import { users } from "./users.ts";

/** What was done with whose authority. Append-only by grant and by trigger; no recipe, no e-mail in it. */
export const auditLog = pgTable(
  "audit_log",
  {
    id: bigint("id", { mode: "number" }).primaryKey().generatedAlwaysAsIdentity(),
    at: timestamp("at", { withTimezone: true }).notNull().defaultNow(),
    actorId: uuid("actor_id").references(() => users.id, { onDelete: "set null" }),
    action: text("action").notNull(),
    subjectId: uuid("subject_id"),
    detail: jsonb("detail").notNull().default({}),
  },
  (t) => [
    index("audit_log_at").on(t.at),
    // Nobody writes in another's name or at another time.
    pgPolicy("audit_log_append", {
      for: "insert",
      to: web,
      withCheck: sql`actor_id is not distinct from ${actorUserId} and at = now()`,
    }),
    // Editions published from the command line: by nobody the product knows.
    pgPolicy("audit_log_builder", { for: "insert", to: editionBuilder, withCheck: sql`actor_id is null` }),
    adminMay("audit_log", "select"),
  ],
);
