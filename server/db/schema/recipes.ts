import { index, integer, pgEnum, pgTable, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { recipeStates } from "../../../shared/contracts/recipes.ts";
import { ownShopOnly } from "./roles.ts";
import { shops } from "./shops.ts";

export const recipeState = pgEnum("recipe_state", recipeStates);

/** A recipe's identity and where it stands; what it says is in its versions. */
export const recipes = pgTable(
  "recipes",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    shopId: uuid("shop_id")
      .notNull()
      .references(() => shops.id, { onDelete: "cascade" }),
    state: recipeState("state").notNull().default("draft"),
    /** Number of the newest version, in the same transaction as that version's row. */
    currentVersion: integer("current_version").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    changedAt: timestamp("changed_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    unique("recipes_id_shop").on(t.id, t.shopId),
    index("recipes_shop_changed").on(t.shopId, t.changedAt),
    ownShopOnly("recipes"),
  ],
);
