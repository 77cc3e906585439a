import { sql } from "drizzle-orm";
import { check, integer, pgEnum, pgPolicy, pgTable, text, timestamp, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { actorEmail, adminMay, web } from "./roles.ts";
import { shops } from "./shops.ts";
import { users } from "./users.ts";

export const applicationState = pgEnum("application_state", ["waiting", "admitted", "declined"]);

export const applications = pgTable(
  "applications",
  {
    id: uuid("id").primaryKey(),
    shopName: text("shop_name").notNull(),
    place: text("place").notNull(),
    contactName: text("contact_name").notNull(),
    email: text("email").notNull(),
    machines: integer("machines").notNull(),
    about: text("about").notNull(),
    state: applicationState("state").notNull().default("waiting"),
    reason: text("reason").notNull().default(""),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    decidedAt: timestamp("decided_at", { withTimezone: true }),
    decidedBy: uuid("decided_by").references(() => users.id, { onDelete: "set null" }),
    shopId: uuid("shop_id").references(() => shops.id, { onDelete: "set null" }),
  },
  (t) => [
    uniqueIndex("applications_waiting_email").on(t.email).where(sql`state = 'waiting'`),
    check("applications_email_lower", sql`email = lower(email)`),
    pgPolicy("applications_anyone_applies", {
      for: "insert",
      to: web,
      withCheck: sql`state = 'waiting' and reason = '' and decided_at is null and decided_by is null and shop_id is null`,
    }),
    pgPolicy("applications_own", { for: "select", to: web, using: sql`email = ${actorEmail}` }),
    adminMay("applications", "select"),
    adminMay("applications", "update"),
  ],
);
