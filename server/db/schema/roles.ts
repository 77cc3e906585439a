import { sql } from "drizzle-orm";
import { pgPolicy, pgRole } from "drizzle-orm/pg-core";

/** The API's role: sees a shop's rows only while it acts for that shop. Created by bootstrap, not by a migration. */
export const web = pgRole("web").existing();
/** The job runner's role: reads contributions under opaque numbers, writes editions, sees no name and no person. */
export const editionBuilder = pgRole("edition_builder").existing();

// Wrapped in a sub-select so that PostgreSQL reads each setting once a statement, not once a row.
export const actorShopId = sql`(select nullif(current_setting('app.shop_id', true), '')::uuid)`;
export const actorUserId = sql`(select nullif(current_setting('app.user_id', true), '')::uuid)`;
/** The verified e-mail of whoever signs in, and the provider's name for them: set while they sign in. */
export const actorEmail = sql`(select nullif(current_setting('app.email', true), ''))`;
export const actorIdentity = sql`(select nullif(current_setting('app.identity', true), ''))`;
/** False in every transaction of a request. Sessions and request counts are kept outside of one, by the server itself. */
export const nobodyActs = sql`(select coalesce(current_setting('app.acting', true), '') <> 'yes')`;
export const actorIsAdmin = sql`(select current_setting('app.admin', true) = 'yes')`;

/** The policy of every tenant table: rows of the acting shop, to read and to write, and none besides. */
export function ownShopOnly(table: string) {
  const own = sql`shop_id = ${actorShopId}`;
  return pgPolicy(`${table}_own_shop`, { for: "all", to: web, using: own, withCheck: own });
}

export function adminMay(table: string, command: "select" | "insert" | "update" | "delete") {
  const rule = command === "insert" ? { withCheck: actorIsAdmin } : { using: actorIsAdmin };
  return pgPolicy(`${table}_admin_${command}`, { for: command, to: web, ...rule });
}
