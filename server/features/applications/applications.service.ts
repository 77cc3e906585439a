import { randomUUID } from "node:crypto";
import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import { appendAudit } from "#server/features/audit/audit.service.ts";
import type { UserActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Application, ApplicationInput, getOwnApplication } from "#shared/contracts/applications.ts";
import * as queries from "./applications.queries.ts";

/** More than a network of small shops decides in years; bounds the answer should somebody flood the form. */
const listedAtMost = 1000;

function present({ decidedBy: _, shopId: __, ...row }: queries.ApplicationRow): Application {
  return { ...row, createdAt: row.createdAt.toISOString(), decidedAt: row.decidedAt?.toISOString() ?? null };
}

/** Keeps at most one waiting application of an address. Nothing tells whether this one was kept. */
export function apply(tx: Db, input: ApplicationInput): Promise<void> {
  return queries.insertApplication(tx, { ...input, id: randomUUID() });
}

export async function ownApplication(tx: Db, actor: UserActor): Promise<z.input<typeof getOwnApplication.response>> {
  const row = await queries.findNewestApplication(tx, actor.email);
  return { application: row ? present(row) : null };
}

export async function listApplications(tx: Db): Promise<Application[]> {
  return (await queries.listApplications(tx, listedAtMost)).map(present);
}

async function requireWaiting(tx: Db, id: string): Promise<queries.ApplicationRow> {
  const row = await queries.findApplicationLocked(tx, id);
  if (!row) throw new ProblemError("not-found", { detail: "There is no such application" });
  if (row.state !== "waiting") throw new ProblemError("already-decided", { current: present(row) });
  return row;
}

const takenDetail = {
  member: "This e-mail address belongs to a member of the network already",
  invited: "This e-mail address has been admitted already and has not signed in since",
};

/** Makes the shop and leaves an invitation for its applicant, who becomes owner at their next sign-in. */
export async function admit(tx: Db, actor: UserActor, id: string): Promise<Application> {
  const row = await requireWaiting(tx, id);
  const standing = await queries.findEmailStanding(tx, row.email);
  if (standing === "member" || standing === "invited") {
    throw new ProblemError("already-exists", { detail: takenDetail[standing] });
  }
  const shopId = randomUUID();
  await queries.insertShop(tx, { id: shopId, name: row.shopName, place: row.place });
  await queries.insertInvitation(tx, { shopId, email: row.email, role: "owner" });
  const decided = await queries.decideApplication(tx, id, { state: "admitted", decidedBy: actor.userId, shopId });
  await appendAudit(tx, actor, "application-admitted", id, { shopId });
  return present(decided);
}

/** The reason stays with the application, for its applicant alone to read, and not in the audit log. */
export async function decline(tx: Db, actor: UserActor, id: string, reason: string): Promise<Application> {
  await requireWaiting(tx, id);
  const decided = await queries.decideApplication(tx, id, { state: "declined", decidedBy: actor.userId, reason });
  await appendAudit(tx, actor, "application-declined", id);
  return present(decided);
}
