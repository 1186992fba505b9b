import type { NotebookDocument } from "../../shared/notebook/document";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";

/** A new notebook, its owner's alone. */
export async function createNotebook(
  db: Db,
  notebook: { ownerId: string; groupId: string | null; document: NotebookDocument; at: Date },
): Promise<{ id: string }> {
  const { ownerId, groupId, document, at } = notebook;
  const [created] = await db
    .insert(notebooks)
    .values({
      ownerId,
      groupId,
      title: document.title,
      document,
      savedBy: ownerId,
      savedAt: at,
      createdAt: at,
    })
    .returning({ id: notebooks.id });
  return created!;
}
