import { and, eq, ilike, or, type SQL, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { shops } from "#server/db/schema/shops.ts";
import type { Member } from "#shared/contracts/members.ts";

export type MemberRow = Omit<Member, "joinedAt"> & { joinedAt: Date };

const overview = {
  id: sql<string>`id`,
  name: sql<string>`name`,
  place: sql<string>`place`,
  state: sql<Member["state"]>`state`,
  stateReason: sql<string>`state_reason`,
  joinedAt: sql`joined_at`.mapWith(shops.joinedAt),
  people: sql<number>`people`,
  machines: sql<number>`machines`,
  sharedRecipes: sql<number>`shared_recipes`,
};

/** Counts come from a function of the database's: no policy opens machines or shares to admins. */
function selectMembers(tx: Db, filter: SQL | undefined): Promise<MemberRow[]> {
  return tx.select(overview).from(sql`member_overview()`).where(filter).orderBy(sql`lower(name)`, sql`id`);
}

/** @param search  part of a name or place, in any case */
export function listMembers(tx: Db, search?: string, state?: Member["state"]): Promise<MemberRow[]> {
  const pattern = `%${(search ?? "").replace(/[\\%_]/g, "\\$&")}%`;
  return selectMembers(
    tx,
    and(
      search ? or(ilike(overview.name, pattern), ilike(overview.place, pattern)) : undefined,
      state ? eq(overview.state, state) : undefined,
    ),
  );
}

export async function findMember(tx: Db, id: string): Promise<MemberRow | undefined> {
  const [row] = await selectMembers(tx, eq(overview.id, id));
  return row;
}

/** False when the shop is not in the state it would leave: of two admins at once, one gets true. */
export async function changeShopState(
  tx: Db,
  id: string,
  from: Member["state"],
  to: Pick<Member, "state" | "stateReason">,
): Promise<boolean> {
  const changed = await tx
    .update(shops)
    .set(to)
    .where(and(eq(shops.id, id), eq(shops.state, from)))
    .returning({ id: shops.id });
  return changed.length > 0;
}

/** Signs everybody of a shop out, wherever they are signed in. */
export async function endShopSessions(tx: Db, shopId: string): Promise<void> {
  await tx.execute(sql`select end_shop_sessions(${shopId})`);
}
