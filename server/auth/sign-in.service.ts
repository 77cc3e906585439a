import type { Db } from "#server/db/client.ts";
import { actAs } from "../http/actor.queries.ts";
import {
  acceptInvitation,
  bindIdentity,
  findUserByIdentity,
  findUserNeverSignedIn,
  insertUser,
} from "./sign-in.queries.ts";
import type { Identity } from "./strategy.ts";

/**
 * The user behind an identity the provider vouches for; made on the first sign-in. An e-mail address opens an
 * invitation or a prepared account only where the provider says that it is verified.
 */
export function findOrMakeUser(db: Db, provider: string, identity: Identity): Promise<string> {
  return db.transaction(async (tx) => {
    const name = identity.name ?? identity.email;
    await actAs(tx, { identity: `${provider}|${identity.sub}`, email: identity.email });
    const known = await findUserByIdentity(tx, provider, identity.sub);
    const prepared = known || !identity.email_verified ? undefined : await findUserNeverSignedIn(tx, identity.email);
    if (prepared) await bindIdentity(tx, prepared.id, provider, identity.sub, name);
    const user =
      known ?? prepared ?? (await insertUser(tx, { provider, subject: identity.sub, email: identity.email, name }));
    if (identity.email_verified) {
      await actAs(tx, { user_id: user.id });
      await acceptInvitation(tx, user.id, identity.email);
    }
    return user.id;
  });
}
