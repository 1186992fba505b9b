import { and, eq, inArray } from "drizzle-orm";
import type { Db } from "../db/client";
import { findHeir } from "../db/reads/membersNotebooks";
import { groupMembers } from "../db/tables/groupMembers";
import { notebooks } from "../db/tables/notebooks";
import { notebookShares } from "../db/tables/notebookShares";
import { lockMembership } from "./lockMembership";
import { recordAct } from "./recordAct";

/**
 * Takes a person out of a group, whether they leave or are removed. Their notebooks in the group stay in it and become
 * a lead's: of the one who removes them, or, where they leave, of the one who has been in the group longest.
 */
export async function removeMember(
  db: Db,
  { groupId, userId, actorId, at }: { groupId: string; userId: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { role, name } = await lockMembership(tx, { groupId, userId, newRole: null, actorId });
    await tx
      .delete(groupMembers)
      .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.userId, userId)));
    const heir = await findHeir(tx, { groupId, userId, actorId });
    const passed = await tx
      .update(notebooks)
      .set({ ownerId: heir.id })
      .where(and(eq(notebooks.groupId, groupId), eq(notebooks.ownerId, userId)))
      .returning({ id: notebooks.id });
    if (passed.length > 0) {
      // Whoever owns a notebook has no share in it besides.
      const ids = passed.map(({ id }) => id);
      await tx
        .delete(notebookShares)
        .where(and(inArray(notebookShares.notebookId, ids), eq(notebookShares.userId, heir.id)));
    }
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: userId === actorId ? "member_left" : "member_removed",
      subject: "person",
      subjectId: userId,
      subjectName: name,
      details: {
        before: role,
        ...(passed.length > 0 ? { notebooks: passed.length, with: heir.name } : {}),
      },
    });
  });
}
