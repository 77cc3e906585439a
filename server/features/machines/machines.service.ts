import { type Db, databaseError, violates } from "#server/db/client.ts";
import { emptyTellingTexts } from "#server/features/sharing/telling-texts.service.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Machine, MachineInput } from "#shared/contracts/machines.ts";
import * as queries from "./machines.queries.ts";

function present({ shopId: _, createdAt: __, ...row }: queries.MachineRow, recipes: number): Machine {
  return { ...row, recipes, updatedAt: row.updatedAt.toISOString() };
}

/** A name is taken once in a shop: said at the field. */
async function refuseTakenName<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (!violates(error, "machines_name")) throw error;
    const errors = [{ pointer: "/name", detail: "Another machine of this shop has that name" }];
    throw new ProblemError("already-exists", { errors });
  }
}

/** The row of one of the shop's own machines; any other id does not exist for it. */
export async function requireMachine(tx: Db, actor: ShopActor, id: string): Promise<queries.MachineRow> {
  const row = await queries.findMachine(tx, actor.shopId, id);
  if (!row) throw new ProblemError("not-found", { detail: "This shop has no such machine" });
  return row;
}

export async function listMachines(tx: Db, actor: ShopActor): Promise<Machine[]> {
  const recipes = await queries.countRecipesByMachine(tx, actor.shopId);
  const rows = await queries.listMachines(tx, actor.shopId);
  return rows.map((row) => present(row, recipes.get(row.id) ?? 0));
}

export async function getMachine(tx: Db, actor: ShopActor, id: string): Promise<Machine> {
  const row = await requireMachine(tx, actor, id);
  const recipes = await queries.countRecipesByMachine(tx, actor.shopId);
  return present(row, recipes.get(id) ?? 0);
}

export async function createMachine(tx: Db, actor: ShopActor, input: MachineInput): Promise<Machine> {
  const row = await refuseTakenName(queries.insertMachine(tx, { ...input, shopId: actor.shopId }));
  await emptyTellingTexts(tx, actor.shopId);
  return present(row, 0);
}

export async function updateMachine(
  tx: Db,
  actor: ShopActor,
  id: string,
  { baseVersion, ...input }: MachineInput & { baseVersion: number },
): Promise<Machine> {
  const before = await getMachine(tx, actor, id);
  const row = await refuseTakenName(queries.updateMachine(tx, actor.shopId, id, baseVersion, input));
  if (!row) throw new ProblemError("stale-version", { current: before });
  if (row.name !== before.name) await emptyTellingTexts(tx, actor.shopId);
  return present(row, before.recipes);
}

export async function deleteMachine(tx: Db, actor: ShopActor, id: string): Promise<void> {
  await requireMachine(tx, actor, id);
  try {
    await queries.deleteMachine(tx, actor.shopId, id);
  } catch (error) {
    const heldByRecipes = databaseError(error)?.code === "23503";
    throw heldByRecipes
      ? new ProblemError("in-use", { detail: "Recipes in the book were made for this machine" })
      : error;
  }
}
