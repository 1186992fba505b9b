import type { ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { notebookShares } from "../db/tables/notebookShares";

/** Shares a notebook with one person by a role, in place of the one they had. */
export async function shareWithPerson(
  db: Db,
  { notebookId, userId, role, at }: { notebookId: string; userId: string; role: ShareRole; at: Date },
): Promise<void> {
  await db
    .insert(notebookShares)
    .values({ notebookId, userId, role, createdAt: at })
    .onConflictDoUpdate({ target: [notebookShares.notebookId, notebookShares.userId], set: { role } });
}
