import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { lockDraft } from "./lockDraft";

/** Gives the draft another title, as its next revision. */
export async function renameNotebook(
  db: Db,
  { notebookId, title, actorId, at }: { notebookId: string; title: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { revision, document } = (await lockDraft(tx, notebookId)).current;
    if (document.title === title) return;
    await tx
      .update(notebooks)
      .set({ document: { ...document, title }, title, revision: revision + 1, savedAt: at, savedBy: actorId })
      .where(eq(notebooks.id, notebookId));
  });
}
