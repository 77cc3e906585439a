import type { z } from "zod";
import { joinIfInvited } from "#server/auth/sign-in.service.ts";
import type { Db } from "#server/db/client.ts";
import { becomeActor } from "#server/http/actor.queries.ts";
import type { Actor, UserActor } from "#server/http/actor.ts";
import type { changePreferences as contract, Session } from "#shared/contracts/accounts.ts";
import { updatePreferences } from "./accounts.queries.ts";

export function sessionOf(actor: Actor, demo: boolean): Session {
  const { userId, shopId, shopState, role } = actor;
  return {
    user: userId === null ? null : { id: userId, name: actor.name, email: actor.email },
    shop: shopId && shopState && role ? { id: shopId, name: actor.shopName, state: shopState, role } : null,
    admin: actor.admin,
    units: actor.units,
    theme: actor.theme,
    demo,
  };
}

export async function changePreferences(
  tx: Db,
  actor: UserActor,
  input: z.output<typeof contract.body>,
): Promise<Actor> {
  const chosen = { units: input.units ?? actor.units, theme: input.theme ?? actor.theme };
  await updatePreferences(tx, actor.userId, chosen);
  return { ...actor, ...chosen };
}

/**
 * Somebody who waits for admission need not sign out and in again: an invitation made meanwhile counts at once. Accounts
 * are made for verified addresses only.
 */
export async function joinWhereInvited(tx: Db, actor: Actor): Promise<Actor> {
  if (actor.userId === null || actor.shopId !== null || actor.admin) return actor;
  const joined = await joinIfInvited(tx, actor.userId, actor.email);
  return joined ? becomeActor(tx, actor.userId) : actor;
}
