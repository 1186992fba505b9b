import { documentLimits, type NotebookDocument } from "../../shared/notebook/document";
import type { Db } from "../db/client";
import { createNotebook } from "./createNotebook";
import { recordAct } from "./recordAct";

/** A copy of a notebook's draft as the actor's own, without its versions and shares. */
export async function duplicateNotebook(
  db: Db,
  copy: {
    original: { title: string; document: NotebookDocument };
    groupId: string | null;
    actorId: string;
    at: Date;
  },
): Promise<{ id: string }> {
  const { original, groupId, actorId, at } = copy;
  return db.transaction(async (tx) => {
    const document = { ...original.document, title: copyTitle(original.title) };
    const created = await createNotebook(tx, { ownerId: actorId, groupId, document, at });
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "notebook_duplicated",
      subject: "notebook",
      subjectId: created.id,
      subjectName: document.title,
    });
    return created;
  });
}

/** "Nirel, a copy", cut where it would be too long. */
function copyTitle(title: string): string {
  const ending = ", a copy";
  return `${title.slice(0, documentLimits.titleLength - ending.length).trimEnd()}${ending}`;
}
