import type { Db } from "#server/db/client.ts";
import { appendAudit } from "#server/features/audit/audit.service.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Edition } from "#shared/contracts/editions.ts";
import type { BuiltUnder } from "./build-edition.ts";
import * as queries from "./editions.queries.ts";
import { presentEdition } from "./released.ts";

/** Whoever decides: an admin, or nobody the product knows where it is done from the command line. */
type Decider = { userId: string | null };

export async function listEditions(tx: Db): Promise<Edition[]> {
  const rows = await queries.listEditions(tx);
  return rows.map(presentEdition);
}

async function requireListed(tx: Db, id: string): Promise<Edition> {
  const found = (await listEditions(tx)).find((edition) => edition.id === id);
  if (!found) throw new ProblemError("not-found", { detail: "There is no such edition" });
  return found;
}

function refuse(detail: string): never {
  throw new ProblemError("wrong-state", { detail });
}

/**
 * Only the newest built edition comes out, and only over the edition it was compared with: the three-shop step holds
 * between those two and no others.
 */
async function requirePublishable(tx: Db, edition: Edition): Promise<void> {
  if (edition.state !== "built") refuse(`Edition ${edition.number} is ${edition.state} already`);
  const newest = await queries.findNewestBuilt(tx);
  if (newest?.id !== edition.id) refuse(`Edition ${newest?.number} was built after it: publish that one`);
  const last = await queries.findLastPublished(tx);
  if ((newest.parameters as BuiltUnder).comparedWith !== (last?.id ?? null)) {
    refuse(`Edition ${last?.number} came out while this one was built: build again`);
  }
}

export async function publishEdition(tx: Db, decider: Decider, id: string): Promise<Edition> {
  await queries.lockDecisions(tx);
  const edition = await requireListed(tx, id);
  await requirePublishable(tx, edition);
  await queries.markPublished(tx, id, decider.userId);
  await queries.discardOlderBuilt(tx, edition);
  await appendAudit(tx, decider, "edition-published", id, { number: edition.number });
  return requireListed(tx, id);
}

export async function discardEdition(tx: Db, decider: Decider, id: string): Promise<void> {
  await queries.lockDecisions(tx);
  const edition = await requireListed(tx, id);
  if (!(await queries.markDiscarded(tx, id))) refuse(`Edition ${edition.number} is ${edition.state} already`);
  await appendAudit(tx, decider, "edition-discarded", id, { number: edition.number });
}
