import { sql } from "drizzle-orm";
import { pgEnum, pgPolicy, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { actorShopId, actorUserId, adminMay, web } from "./roles.ts";

export const shopState = pgEnum("shop_state", ["active", "suspended"]);

export const shops = pgTable(
  "shops",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    name: text("name").notNull(),
    place: text("place").notNull(),
    state: shopState("state").notNull().default("active"),
    stateReason: text("state_reason").notNull().default(""),
    joinedAt: timestamp("joined_at", { withTimezone: true }).notNull().defaultNow(),
  },
  () => [
    pgPolicy("shops_own", {
      for: "select",
      to: web,
      using: sql`id = ${actorShopId} or id in (select m.shop_id from memberships m where m.user_id = ${actorUserId})`,
    }),
    adminMay("shops", "select"),
    adminMay("shops", "insert"),
    adminMay("shops", "update"),
  ],
);
