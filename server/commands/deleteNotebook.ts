import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { lockNotebook } from "./lockNotebook";
import { recordAct } from "./recordAct";

/** Puts a notebook in the bin. */
export async function deleteNotebook(
  db: Db,
  { notebookId, actorId, at }: { notebookId: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { groupId, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    await tx.update(notebooks).set({ deletedAt: at }).where(eq(notebooks.id, notebookId));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "notebook_deleted",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
    });
  });
}
