import type { Db } from "#server/db/client.ts";
import { appendAudit } from "#server/features/audit/audit.service.ts";
import type { UserActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Member } from "#shared/contracts/members.ts";
import * as queries from "./members.queries.ts";

function present(row: queries.MemberRow): Member {
  return { ...row, joinedAt: row.joinedAt.toISOString() };
}

export async function listMembers(
  tx: Db,
  { search, state }: { search?: string | undefined; state?: Member["state"] | undefined },
): Promise<Member[]> {
  return (await queries.listMembers(tx, search, state)).map(present);
}

async function requireMember(tx: Db, id: string): Promise<Member> {
  const row = await queries.findMember(tx, id);
  if (!row) throw new ProblemError("not-found", { detail: "There is no such member" });
  return present(row);
}

/** The reason goes into the audit log too: the shop's own copy is cleared when it is taken back. */
export async function suspend(tx: Db, actor: UserActor, id: string, reason: string): Promise<Member> {
  const before = await requireMember(tx, id);
  const to = { state: "suspended", stateReason: reason } as const;
  if (!(await queries.changeShopState(tx, id, "active", to))) {
    throw new ProblemError("wrong-state", { detail: `${before.name} is suspended already` });
  }
  await queries.endShopSessions(tx, id);
  await appendAudit(tx, actor, "member-suspended", id, { reason });
  return requireMember(tx, id);
}

export async function reinstate(tx: Db, actor: UserActor, id: string): Promise<Member> {
  const before = await requireMember(tx, id);
  if (!(await queries.changeShopState(tx, id, "suspended", { state: "active", stateReason: "" }))) {
    throw new ProblemError("wrong-state", { detail: `${before.name} is not suspended` });
  }
  await appendAudit(tx, actor, "member-reinstated", id);
  return requireMember(tx, id);
}
