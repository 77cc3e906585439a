import { eq } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { users } from "#server/db/schema/users.ts";

type UserRow = typeof users.$inferSelect;

export async function updatePreferences(
  tx: Db,
  userId: string,
  values: Pick<UserRow, "units" | "theme">,
): Promise<void> {
  await tx.update(users).set(values).where(eq(users.id, userId));
}
