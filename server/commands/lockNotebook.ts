import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { conflict, notFound } from "../errors";

/**
 * A notebook with its row locked until the transaction ends, for a change that is its owner's to make.
 *
 * @throws AppError if it is gone or in the bin, or has another owner by now
 */
export async function lockNotebook(tx: Db, { notebookId, ownerId }: { notebookId: string; ownerId: string }) {
  const [notebook] = await tx
    .select({
      ownerId: notebooks.ownerId,
      groupId: notebooks.groupId,
      groupRole: notebooks.groupRole,
      title: notebooks.title,
      archivedAt: notebooks.archivedAt,
    })
    .from(notebooks)
    .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
    .for("update");
  if (!notebook) throw notFound("notebook");
  if (notebook.ownerId !== ownerId) {
    throw conflict("owner_changed", "This notebook has another owner by now. Ask them to do this.");
  }
  return notebook;
}
