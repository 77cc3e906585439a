import type { Db } from "#server/db/client.ts";
import type { Actor } from "#server/http/actor.ts";
import { insertAuditEntry } from "./audit.queries.ts";

/**
 * Writes down, in the transaction that does it, what was done and with whose authority.
 * @param detail  ids and reasons; no e-mail address, no recipe, nobody's name
 */
export function appendAudit(
  tx: Db,
  actor: Pick<Actor, "userId">,
  action: string,
  subjectId: string | null,
  detail: Record<string, unknown> = {},
): Promise<void> {
  return insertAuditEntry(tx, { actorId: actor.userId, action, subjectId, detail });
}
