import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { notFound } from "../errors";

/** Puts a notebook in the bin. */
export async function deleteNotebook(
  db: Db,
  { notebookId, at }: { notebookId: string; at: Date },
): Promise<void> {
  const deleted = await db
    .update(notebooks)
    .set({ deletedAt: at })
    .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
    .returning({ id: notebooks.id });
  if (deleted.length === 0) throw notFound("notebook");
}
