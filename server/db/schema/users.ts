import { sql } from "drizzle-orm";
import { check, pgEnum, pgPolicy, pgTable, text, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { actorEmail, actorIdentity, actorShopId, actorUserId, web } from "./roles.ts";

export const unitSystem = pgEnum("unit_system", ["metric", "inch"]);
export const theme = pgEnum("theme", ["system", "light", "dark"]);

/** A person, by an e-mail address that was verified. `provider` and `subject` are empty until they first sign in. */
export const users = pgTable(
  "users",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    provider: text("provider"),
    subject: text("subject"),
    email: text("email").notNull(),
    name: text("name").notNull(),
    units: unitSystem("units").notNull().default("metric"),
    theme: theme("theme").notNull().default("system"),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    unique("users_identity").on(t.provider, t.subject),
    unique("users_email").on(t.email),
    check("users_email_lower", sql`email = lower(email)`),
    pgPolicy("users_own_shop", {
      for: "select",
      to: web,
      using: sql`id = ${actorUserId} or id in (select m.user_id from memberships m where m.shop_id = ${actorShopId})`,
    }),
    pgPolicy("users_signing_in", {
      for: "select",
      to: web,
      using: sql`provider || '|' || subject = ${actorIdentity} or email = ${actorEmail}`,
    }),
    pgPolicy("users_first_sign_in", {
      for: "insert",
      to: web,
      withCheck: sql`email = ${actorEmail} and provider || '|' || subject = ${actorIdentity}`,
    }),
    // Oneself, or the prepared account that whoever signs in takes over. A trigger refuses any later change of identity.
    pgPolicy("users_self", {
      for: "update",
      to: web,
      using: sql`id = ${actorUserId} or (email = ${actorEmail} and subject is null)`,
      withCheck: sql`id = ${actorUserId} or (email = ${actorEmail} and provider || '|' || subject = ${actorIdentity})`,
    }),
  ],
);

export const networkAdmins = pgTable(
  "network_admins",
  {
    userId: uuid("user_id")
      .primaryKey()
      .references(() => users.id, { onDelete: "cascade" }),
  },
  () => [pgPolicy("network_admins_self", { for: "select", to: web, using: sql`user_id = ${actorUserId}` })],
);
