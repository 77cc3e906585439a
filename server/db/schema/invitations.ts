import { sql } from "drizzle-orm";
import { index, pgPolicy, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
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
    pgPolicy("invitations_to_me", { for: "select", to: web, using: sql`email = ${actorEmail}` }),
    pgPolicy("invitations_accept", {
      for: "update",
      to: web,
      using: sql`email = ${actorEmail}`,
      withCheck: sql`email = ${actorEmail}`,
    }),
    adminMay("invitations", "insert"),
  ],
);
