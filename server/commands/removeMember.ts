import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../db/client";
import { groupMembers } from "../db/tables/groupMembers";
import { notebooks } from "../db/tables/notebooks";
import { lockMembership } from "./lockMembership";

/**
 * Takes a person out of a group, whether they leave or are removed. Notebooks that were theirs alone go with them to
 * their own shelf; those shared with the group stay in it, still theirs.
 */
export async function removeMember(
  db: Db,
  { groupId, userId }: { groupId: string; userId: string },
): Promise<void> {
  await db.transaction(async (tx) => {
    await lockMembership(tx, { groupId, userId, newRole: null });
    await tx
      .delete(groupMembers)
      .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.userId, userId)));
    await tx
      .update(notebooks)
      .set({ groupId: null })
      .where(and(eq(notebooks.groupId, groupId), eq(notebooks.ownerId, userId), isNull(notebooks.groupRole)));
  });
}
