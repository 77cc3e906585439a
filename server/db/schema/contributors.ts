import { bigint, pgTable, uuid } from "drizzle-orm/pg-core";
import { machines } from "./machines.ts";
import { shops } from "./shops.ts";

/**
 * The opaque number under which a shop's contributions are counted. Random, so that it tells neither name nor order of
 * joining; kept apart from `shops` so that no grant on that table reveals it. `web` may not read it.
 */
export const contributors = pgTable("contributors", {
  shopId: uuid("shop_id")
    .primaryKey()
    .references(() => shops.id, { onDelete: "cascade" }),
  number: bigint("number", { mode: "number" }).notNull().unique(),
}).enableRLS();

export const contributingMachines = pgTable("contributing_machines", {
  machineId: uuid("machine_id")
    .primaryKey()
    .references(() => machines.id, { onDelete: "cascade" }),
  number: bigint("number", { mode: "number" }).notNull().unique(),
}).enableRLS();
