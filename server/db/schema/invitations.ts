import { sql } from "drizzle-orm";
import { check, index, pgPolicy, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { memberRole } from "./memberships.ts";
import { actorEmail, adminMay, web } from "./roles.ts";
import { shops } from "./shops.ts";

/** Leave to join a shop, for whoever proves to own the e-mail address. */
export const invitations = pgTable(
  "invitations",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    shopId: uuid("shop_id")
      .notNull()
      .references(() => shops.id, { onDelete: "cascade" }),
    email: text("email").notNull(),
    role: memberRole("role").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    acceptedAt: timestamp("accepted_at", { withTimezone: true }),
  },
  (t) => [
    index("invitations_email").on(t.email),
    check("invitations_email_lower", sql`email = lower(email)`),
    pgPolicy("invitations_to_me", { for: "select", to: web, using: sql`email = ${actorEmail}` }),
    // Accepted once, never opened again.
    pgPolicy("invitations_accept", {
      for: "update",
      to: web,
      using: sql`email = ${actorEmail} and accepted_at is null`,
      withCheck: sql`email = ${actorEmail} and accepted_at is not null`,
    }),
    adminMay("invitations", "insert"),
  ],
);
