import type { Db } from "#server/db/client.ts";
import { auditLog } from "#server/db/schema/audit-log.ts";

export async function insertAuditEntry(tx: Db, values: typeof auditLog.$inferInsert): Promise<void> {
  await tx.insert(auditLog).values(values);
}
