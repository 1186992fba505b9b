import { and, eq } from "drizzle-orm";
import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { groupMembers } from "../db/tables/groupMembers";
import { lockMembership } from "./lockMembership";

export async function setMemberRole(
  db: Db,
  { groupId, userId, role }: { groupId: string; userId: string; role: GroupRole },
): Promise<void> {
  await db.transaction(async (tx) => {
    await lockMembership(tx, { groupId, userId, newRole: role });
    await tx
      .update(groupMembers)
      .set({ role })
      .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.userId, userId)));
  });
}
