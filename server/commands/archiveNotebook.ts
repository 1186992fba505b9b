import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { lockNotebook } from "./lockNotebook";
import { recordAct } from "./recordAct";

/** Puts a notebook away, to be read only and out of the usual list; or takes it out again. */
export async function archiveNotebook(
  db: Db,
  {
    notebookId,
    isArchived,
    actorId,
    at,
  }: { notebookId: string; isArchived: boolean; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { groupId, title, archivedAt } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    if ((archivedAt !== null) === isArchived) return;
    await tx
      .update(notebooks)
      .set({ archivedAt: isArchived ? at : null })
      .where(eq(notebooks.id, notebookId));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: isArchived ? "notebook_archived" : "notebook_unarchived",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
    });
  });
}
