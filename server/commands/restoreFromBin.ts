import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";

/** Takes a notebook out of the bin, as it was. */
export async function restoreFromBin(db: Db, { notebookId }: { notebookId: string }): Promise<void> {
  await db.update(notebooks).set({ deletedAt: null }).where(eq(notebooks.id, notebookId));
}
