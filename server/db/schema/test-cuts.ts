import { sql } from "drizzle-orm";
import {
  boolean,
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  pgEnum,
  pgTable,
  text,
  timestamp,
  uuid,
} from "drizzle-orm/pg-core";
import { drossAmounts, topEdges } from "../../../shared/contracts/test-cuts.ts";
import { recipeVersions } from "./recipe-versions.ts";
import { ownShopOnly } from "./roles.ts";
import { users } from "./users.ts";

export const dross = pgEnum("dross", drossAmounts);
export const topEdge = pgEnum("top_edge", topEdges);

export const testCuts = pgTable(
  "test_cuts",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    shopId: uuid("shop_id").notNull(),
    recipeId: uuid("recipe_id").notNull(),
    versionNumber: integer("version_number").notNull(),
    cutAt: timestamp("cut_at", { withTimezone: true }).notNull(),
    cutThrough: boolean("cut_through").notNull(),
    dross: dross("dross").notNull(),
    topEdge: topEdge("top_edge").notNull(),
    bevelDeg: doublePrecision("bevel_deg"),
    kerfWidthMm: doublePrecision("kerf_width_mm"),
    uMm: doublePrecision("u_mm"),
    rz5Um: doublePrecision("rz5_um"),
    acceptable: boolean("acceptable").notNull(),
    note: text("note").notNull().default(""),
    recordedBy: uuid("recorded_by").references(() => users.id, { onDelete: "set null" }),
    recordedAt: timestamp("recorded_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    foreignKey({
      name: "test_cuts_version",
      columns: [t.recipeId, t.versionNumber, t.shopId],
      foreignColumns: [recipeVersions.recipeId, recipeVersions.number, recipeVersions.shopId],
    }).onDelete("cascade"),
    index("test_cuts_recipe").on(t.recipeId, t.cutAt),
    index("test_cuts_shop").on(t.shopId, t.cutAt),
    check("test_cuts_bevel", sql`bevel_deg between -45 and 45`),
    check("test_cuts_kerf", sql`kerf_width_mm between 0.3 and 6`),
    check("test_cuts_u", sql`u_mm between 0 and 20`),
    check("test_cuts_rz5", sql`rz5_um between 0 and 2000`),
    check("test_cuts_acceptable", sql`cut_through or not acceptable`),
    ownShopOnly("test_cuts"),
  ],
);
