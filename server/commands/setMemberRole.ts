import { and, eq } from "drizzle-orm";
import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { groupMembers } from "../db/tables/groupMembers";
import { lockMembership } from "./lockMembership";
import { recordAct } from "./recordAct";

export async function setMemberRole(
  db: Db,
  change: { groupId: string; userId: string; role: GroupRole; actorId: string; at: Date },
): Promise<void> {
  const { groupId, userId, role, actorId, at } = change;
  await db.transaction(async (tx) => {
    const before = await lockMembership(tx, { groupId, userId, newRole: role, actorId });
    if (before.role === role) return;
    await storeRole(tx, { groupId, userId, role });
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "role_set",
      subject: "person",
      subjectId: userId,
      subjectName: before.name,
      details: { role, before: before.role },
    });
  });
}

/** Writes a role down. Whether it may be, and what it does to the group, is settled before. */
export async function storeRole(
  tx: Db,
  { groupId, userId, role }: { groupId: string; userId: string; role: GroupRole },
): Promise<void> {
  await tx
    .update(groupMembers)
    .set({ role })
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.userId, userId)));
}
