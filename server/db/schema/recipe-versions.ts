import { sql } from "drizzle-orm";
import {
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { RecipeOrigin } from "../../../shared/contracts/recipes.ts";
import { materials, processGases, surfaces } from "../../../shared/materials/materials.ts";
import { machines } from "./machines.ts";
import { recipes } from "./recipes.ts";
import { ownShopOnly } from "./roles.ts";
import { users } from "./users.ts";

export const material = pgEnum("material", materials);
export const surface = pgEnum("surface", surfaces);
export const processGas = pgEnum("process_gas", processGases);

/** Append-only: `web` may insert and read, and may change nothing but `proven_at`. The checks repeat the hard limits. */
export const recipeVersions = pgTable(
  "recipe_versions",
  {
    recipeId: uuid("recipe_id").notNull(),
    shopId: uuid("shop_id").notNull(),
    number: integer("number").notNull(),
    machineId: uuid("machine_id").notNull(),
    material: material("material").notNull(),
    grade: text("grade").notNull().default(""),
    surface: surface("surface").notNull(),
    processGas: processGas("process_gas").notNull(),
    thicknessMm: doublePrecision("thickness_mm").notNull(),
    nozzleMm: doublePrecision("nozzle_mm").notNull(),
    currentA: doublePrecision("current_a"),
    pressureBar: doublePrecision("pressure_bar"),
    feedMmMin: doublePrecision("feed_mm_min"),
    cutHeightMm: doublePrecision("cut_height_mm"),
    pierceHeightMm: doublePrecision("pierce_height_mm"),
    pierceDelayS: doublePrecision("pierce_delay_s"),
    arcVoltageV: doublePrecision("arc_voltage_v"),
    kerfWidthMm: doublePrecision("kerf_width_mm"),
    note: text("note").notNull().default(""),
    reason: text("reason").notNull().default(""),
    origin: jsonb("origin").$type<RecipeOrigin>().notNull(),
    changedBy: uuid("changed_by").references(() => users.id, { onDelete: "set null" }),
    changedAt: timestamp("changed_at", { withTimezone: true }).notNull().defaultNow(),
    /** When an acceptable test cut first belonged to this version; null until then. */
    provenAt: timestamp("proven_at", { withTimezone: true }),
  },
  (t) => [
    primaryKey({ columns: [t.recipeId, t.number] }),
    unique("recipe_versions_of_shop").on(t.recipeId, t.number, t.shopId),
    foreignKey({
      name: "recipe_versions_recipe",
      columns: [t.recipeId, t.shopId],
      foreignColumns: [recipes.id, recipes.shopId],
    }).onDelete("cascade"),
    foreignKey({
      name: "recipe_versions_machine",
      columns: [t.machineId, t.shopId],
      foreignColumns: [machines.id, machines.shopId],
    }),
    index("recipe_versions_shop").on(t.shopId, t.material, t.thicknessMm),
    index("recipe_versions_machine_id").on(t.machineId),
    check("recipe_versions_thickness", sql`thickness_mm between 0.4 and 50`),
    check("recipe_versions_nozzle", sql`nozzle_mm between 0.4 and 3`),
    check("recipe_versions_current", sql`current_a between 10 and 400`),
    check("recipe_versions_pressure", sql`pressure_bar between 2 and 9`),
    check("recipe_versions_feed", sql`feed_mm_min between 50 and 15000`),
    check("recipe_versions_cut_height", sql`cut_height_mm between 0.3 and 10`),
    check(
      "recipe_versions_pierce_height",
      sql`pierce_height_mm between 0.5 and 20 and pierce_height_mm >= cut_height_mm`,
    ),
    check("recipe_versions_pierce_delay", sql`pierce_delay_s between 0 and 10`),
    check("recipe_versions_arc_voltage", sql`arc_voltage_v between 50 and 220`),
    check("recipe_versions_kerf", sql`kerf_width_mm between 0.3 and 6`),
    ownShopOnly("recipe_versions"),
  ],
);
