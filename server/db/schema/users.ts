import { sql } from "drizzle-orm";
import { pgEnum, pgPolicy, pgTable, text, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { actorEmail, actorIdentity, actorShopId, actorUserId, web } from "./roles.ts";

export const unitSystem = pgEnum("unit_system", ["metric", "inch"]);
export const theme = pgEnum("theme", ["system", "light", "dark"]);

/** A person. `provider` and `subject` are empty until they first sign in. */
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
    pgPolicy("users_first_sign_in", { for: "insert", to: web, withCheck: sql`email = ${actorEmail}` }),
    pgPolicy("users_self", {
      for: "update",
      to: web,
      using: sql`id = ${actorUserId} or email = ${actorEmail}`,
      withCheck: sql`id = ${actorUserId} or email = ${actorEmail}`,
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
