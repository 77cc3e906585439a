import { eq, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { shops } from "#server/db/schema/shops.ts";
import { networkAdmins, users } from "#server/db/schema/users.ts";
import { type Actor, visitor } from "./actor.ts";

/** Row-level security reads these settings; they end with the transaction. From the first call on, somebody acts. */
export async function actAs(
  tx: Db,
  settings: Partial<Record<"user_id" | "shop_id" | "email" | "identity" | "admin", string>>,
) {
  const calls = Object.entries({ acting: "yes", ...settings }).map(
    ([name, value]) => sql`set_config(${`app.${name}`}, ${value}, true)`,
  );
  await tx.execute(sql`select ${sql.join(calls, sql`, `)}`);
}

/** Who a signed-in user is, with the transaction set to act for them and their shop. A user since removed is a visitor. */
export async function becomeActor(tx: Db, userId: string | null): Promise<Actor> {
  await actAs(tx, { user_id: userId ?? "" });
  if (userId === null) return visitor;
  const [row] = await tx
    .select({ user: users, admin: networkAdmins.userId, role: memberships.role, shop: shops })
    .from(users)
    .leftJoin(networkAdmins, eq(networkAdmins.userId, users.id))
    .leftJoin(memberships, eq(memberships.userId, users.id))
    .leftJoin(shops, eq(shops.id, memberships.shopId))
    .where(eq(users.id, userId));
  if (!row) return visitor;
  const admin = row.admin !== null;
  // Whoever runs the network does none of a shop's work, nor sees its book, whatever they joined before.
  const shop = admin ? null : row.shop;
  const actor: Actor = {
    userId: row.user.id,
    name: row.user.name,
    email: row.user.email,
    units: row.user.units,
    theme: row.user.theme,
    admin,
    shopId: shop?.id ?? null,
    shopName: shop?.name ?? "",
    shopState: shop?.state ?? null,
    role: shop ? row.role : null,
  };
  await actAs(tx, { shop_id: actor.shopId ?? "", email: actor.email, admin: actor.admin ? "yes" : "" });
  return actor;
}
