import { eq } from "drizzle-orm";
import type { NotebookDocument } from "../../shared/notebook/document";
import type { SaveDraftResponse } from "../../shared/schemas/notebooks";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { staleRevision } from "../errors";
import { lockDraft } from "./lockDraft";

/**
 * Saves a draft that was made on a revision, as the next one. What equals the current draft is saved already,
 * on whatever revision it was made: so a save whose answer was lost can be sent again.
 *
 * @throws AppError `stale_revision` with the current draft, if it has moved on
 */
export async function saveDraft(
  db: Db,
  change: { notebookId: string; revision: number; document: NotebookDocument; actorId: string; at: Date },
): Promise<SaveDraftResponse> {
  const { notebookId, revision, document, actorId, at } = change;
  return db.transaction(async (tx) => {
    const { current } = await lockDraft(tx, notebookId);
    if (isEqual(document, current.document)) return { revision: current.revision, savedAt: current.savedAt };
    if (current.revision !== revision) throw staleRevision(current);

    await tx
      .update(notebooks)
      .set({ document, title: document.title, revision: revision + 1, savedAt: at, savedBy: actorId })
      .where(eq(notebooks.id, notebookId));
    return { revision: revision + 1, savedAt: at.toISOString() };
  });
}

/** Both have passed the same schema, which also puts their members in one order. */
function isEqual(one: NotebookDocument, other: NotebookDocument): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
