import type { Db } from "#server/db/client.ts";
import { emptyTellingTexts } from "../features/sharing/telling-texts.service.ts";
import { actAs } from "../http/actor.queries.ts";
import { acceptInvitation, bindPreparedUser, findUserByIdentity, insertUser, type UserRow } from "./sign-in.queries.ts";
import type { Identity } from "./strategy.ts";

/** Why somebody the provider vouches for is not let in. */
export class SignInRefused extends Error {
  constructor(readonly reason: "unverified" | "address-in-use") {
    super(`sign-in refused: ${reason}`);
    this.name = "SignInRefused";
  }
}

/**
 * The user behind an identity the provider vouches for; made on the first sign-in. An e-mail address counts only where
 * the provider says that it is verified: it opens an invitation or a prepared account, and it is kept. A first sign-in
 * without one is refused, because whoever typed another's address would read their application and keep them out.
 */
export function findOrMakeUser(db: Db, provider: string, identity: Identity): Promise<string> {
  return db.transaction(async (tx) => {
    const { sub, email, email_verified: verified } = identity;
    await actAs(tx, { identity: `${provider}|${sub}`, email: verified ? email : "" });
    const known = await findUserByIdentity(tx, provider, sub);
    if (!known && !verified) throw new SignInRefused("unverified");
    const user = known ?? (await makeUser(tx, provider, identity));
    if (verified) {
      await actAs(tx, { user_id: user.id });
      await joinIfInvited(tx, user.id, email);
    }
    return user.id;
  });
}

/**
 * Makes somebody a member where an invitation waits for their address, which the caller knows to be verified.
 * @returns whether they joined
 */
export async function joinIfInvited(tx: Db, userId: string, email: string): Promise<boolean> {
  const shopId = await acceptInvitation(tx, userId, email);
  if (shopId === undefined) return false;
  // A name more that must not stand in what the shop has written for others.
  await actAs(tx, { shop_id: shopId });
  await emptyTellingTexts(tx, shopId);
  return true;
}

async function makeUser(tx: Db, provider: string, { sub, email, name }: Identity): Promise<UserRow> {
  const values = { provider, subject: sub, email, name: name ?? email };
  const user =
    (await bindPreparedUser(tx, values)) ??
    (await insertUser(tx, values)) ??
    // Made meanwhile by a second tab of the same person.
    (await findUserByIdentity(tx, provider, sub));
  // The address belongs to an account of another identity; addresses are given to new people, accounts are not.
  if (!user) throw new SignInRefused("address-in-use");
  return user;
}
