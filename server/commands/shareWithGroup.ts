import { eq } from "drizzle-orm";
import type { ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { conflict } from "../errors";
import { lockNotebook } from "./lockNotebook";
import { recordAct } from "./recordAct";

/**
 * Shares a notebook with everyone in its group by a role; null takes that back.
 *
 * @throws AppError if the notebook is in no group
 */
export async function shareWithGroup(
  db: Db,
  share: { notebookId: string; role: ShareRole | null; actorId: string; at: Date },
): Promise<void> {
  const { notebookId, role, actorId, at } = share;
  await db.transaction(async (tx) => {
    const { groupId, groupRole: before, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    if (groupId === null && role !== null) {
      throw conflict("no_group", "This notebook is on your own shelf. Move it to a group to share it there.");
    }
    if (before === role) return;
    await tx.update(notebooks).set({ groupRole: role }).where(eq(notebooks.id, notebookId));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: role === null ? "group_share_taken_back" : "group_share_set",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
      details: { ...(role ? { role } : {}), ...(before ? { before } : {}) },
    });
  });
}
