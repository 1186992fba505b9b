import { and, eq, isNotNull } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { notFound } from "../errors";
import { recordAct } from "./recordAct";

/** Takes a notebook out of the bin, as it was. */
export async function restoreFromBin(
  db: Db,
  { notebookId, actorId, at }: { notebookId: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const [restored] = await tx
      .update(notebooks)
      .set({ deletedAt: null })
      .where(and(eq(notebooks.id, notebookId), isNotNull(notebooks.deletedAt)))
      .returning({ groupId: notebooks.groupId, title: notebooks.title });
    if (!restored) throw notFound("notebook");
    await recordAct(tx, {
      at,
      groupId: restored.groupId,
      actorId,
      act: "notebook_restored",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: restored.title,
    });
  });
}
