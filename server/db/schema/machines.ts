import { sql } from "drizzle-orm";
import { check, doublePrecision, integer, pgEnum, pgTable, text, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { drynessLevels, heightControls, startMethods } from "../../../shared/contracts/machines.ts";
import { ownShopOnly } from "./roles.ts";
import { shops } from "./shops.ts";

export const startMethod = pgEnum("start_method", startMethods);
export const dryness = pgEnum("dryness", drynessLevels);
export const heightControl = pgEnum("height_control", heightControls);

/** Figures are double precision: measured quantities, never added up to the cent, and exact both ways with JavaScript. */
export const machines = pgTable(
  "machines",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    shopId: uuid("shop_id")
      .notNull()
      .references(() => shops.id, { onDelete: "cascade" }),
    name: text("name").notNull(),
    powerSourceMaxCurrentA: doublePrecision("power_source_max_current_a").notNull(),
    startMethod: startMethod("start_method").notNull(),
    torchPressureBar: doublePrecision("torch_pressure_bar"),
    dryness: dryness("dryness").notNull(),
    heightControl: heightControl("height_control").notNull(),
    heightControlSampleHz: doublePrecision("height_control_sample_hz"),
    topFeedMmMin: doublePrecision("top_feed_mm_min").notNull(),
    note: text("note").notNull().default(""),
    version: integer("version").notNull().default(1),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    updatedAt: timestamp("updated_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    unique("machines_name").on(t.shopId, t.name),
    unique("machines_id_shop").on(t.id, t.shopId),
    check("machines_current", sql`power_source_max_current_a between 10 and 400`),
    check("machines_pressure", sql`torch_pressure_bar between 2 and 9`),
    check("machines_sample_rate", sql`height_control_sample_hz between 0.1 and 100000`),
    check("machines_top_feed", sql`top_feed_mm_min between 50 and 100000`),
    ownShopOnly("machines"),
  ],
);
