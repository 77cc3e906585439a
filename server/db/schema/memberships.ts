import { sql } from "drizzle-orm";
import { index, pgEnum, pgPolicy, pgTable, timestamp, uuid } from "drizzle-orm/pg-core";
import { actorEmail, actorShopId, actorUserId, web } from "./roles.ts";
import { shops } from "./shops.ts";
import { users } from "./users.ts";

export const memberRole = pgEnum("member_role", ["owner", "operator"]);

/** Who works at which shop, and as what. A person belongs to one shop at most. */
export const memberships = pgTable(
  "memberships",
  {
    userId: uuid("user_id")
      .primaryKey()
      .references(() => users.id, { onDelete: "cascade" }),
    shopId: uuid("shop_id")
      .notNull()
      .references(() => shops.id, { onDelete: "cascade" }),
    role: memberRole("role").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    index("memberships_shop").on(t.shopId),
    pgPolicy("memberships_own", {
      for: "select",
      to: web,
      using: sql`shop_id = ${actorShopId} or user_id = ${actorUserId}`,
    }),
    // A person becomes a member only by an open invitation to their verified e-mail.
    pgPolicy("memberships_by_invitation", {
      for: "insert",
      to: web,
      withCheck: sql`user_id = ${actorUserId} and exists (select 1 from invitations i where i.email = ${actorEmail} and i.shop_id = memberships.shop_id and i.role = memberships.role and i.accepted_at is null)`,
    }),
  ],
);
