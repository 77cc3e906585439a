import { foreignKey, index, pgEnum, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { recipes } from "./recipes.ts";
import { ownShopOnly } from "./roles.ts";

export const shareLevel = pgEnum("share_level", ["counted", "listed"]);

/** A recipe its shop shares. No row: private. */
export const shares = pgTable(
  "shares",
  {
    recipeId: uuid("recipe_id").primaryKey(),
    shopId: uuid("shop_id").notNull(),
    level: shareLevel("level").notNull(),
    /** Words the owner typed for others to read beside a listed recipe, screened before they are kept. */
    publicText: text("public_text").notNull().default(""),
    sharedAt: timestamp("shared_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    foreignKey({
      name: "shares_recipe",
      columns: [t.recipeId, t.shopId],
      foreignColumns: [recipes.id, recipes.shopId],
    }).onDelete("cascade"),
    index("shares_shop").on(t.shopId),
    ownShopOnly("shares"),
  ],
);
