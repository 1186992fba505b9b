import { eq } from "drizzle-orm";
import type { ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";

/** Shares a notebook with everyone in its group by a role; null takes that back. */
export async function shareWithGroup(
  db: Db,
  { notebookId, role }: { notebookId: string; role: ShareRole | null },
): Promise<void> {
  await db.update(notebooks).set({ groupRole: role }).where(eq(notebooks.id, notebookId));
}
