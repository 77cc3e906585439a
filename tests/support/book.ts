import type { TestApi } from "./api.ts";
import { makeMachine, makeStaffedShop } from "./factories.ts";

export type StaffedShop = Awaited<ReturnType<typeof makeStaffedShop>>;
export type MadeMachine = Awaited<ReturnType<typeof makeMachine>>;

/** An empty book: a staffed shop with a machine, its owner signed in, and another shop that knows nothing of it. */
export async function makeBook(api: TestApi) {
  const own = await makeStaffedShop(api.owner);
  const other = await makeStaffedShop(api.owner);
  const machine = await makeMachine(api.owner, own.shop.id);
  return { own, other, machine, boss: await api.as(own.boss.id) };
}
