import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { notebooks } from "../db/tables/notebooks";
import { conflict } from "../errors";
import { lockGroupRow } from "./lockGroup";
import { lockNotebook } from "./lockNotebook";
import { recordAct, type Act } from "./recordAct";

/**
 * Moves a notebook to a group, or to its owner's own shelf. The share with the group that it leaves is taken back;
 * shares in person stay. Both groups' trails tell of it.
 */
export async function moveNotebook(
  db: Db,
  {
    notebookId,
    groupId,
    actorId,
    at,
  }: { notebookId: string; groupId: string | null; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    if (groupId !== null) await requireWriter(tx, groupId, actorId);
    const { groupId: from, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    if (from === groupId) return;
    await tx.update(notebooks).set({ groupId, groupRole: null }).where(eq(notebooks.id, notebookId));
    const line: Omit<Act, "groupId" | "act"> = {
      at,
      actorId,
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
    };
    await recordAct(tx, { ...line, groupId: from, act: "notebook_moved_out" });
    await recordAct(tx, { ...line, groupId, act: "notebook_moved_in" });
  });
}

/** Under a lock on the group, so that nobody brings a notebook in while they are being removed. */
async function requireWriter(tx: Db, groupId: string, actorId: string): Promise<void> {
  await lockGroupRow(tx, groupId);
  const role = await findMembership(tx, groupId, actorId);
  if (role === "lead" || role === "researcher") return;
  throw conflict("not_in_group", "You may not write notebooks in this group any more. Ask its lead.");
}
