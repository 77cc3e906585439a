import type { Db } from "#server/db/client.ts";
import { type OwnNames, screenText } from "#shared/disclosure/text-screening.ts";
import * as queries from "./sharing.queries.ts";

/** What words for others must not hold. */
export async function ownNames(tx: Db, shopId: string): Promise<Required<OwnNames>> {
  return {
    shop: await queries.findShopName(tx, shopId),
    people: await queries.listPeopleNames(tx, shopId),
    machines: await queries.listMachineNames(tx, shopId),
  };
}

/**
 * Words typed before a machine got its name, or before somebody joined, may hold that name. An edition is built without
 * knowing any name, so such words are emptied here, when the name comes; the owner may write others.
 */
export async function emptyTellingTexts(tx: Db, shopId: string): Promise<void> {
  const own = await ownNames(tx, shopId);
  for (const { recipeId, publicText } of await queries.listTexts(tx, shopId)) {
    if (screenText(publicText, own).length > 0) await queries.emptyText(tx, shopId, recipeId);
  }
}
