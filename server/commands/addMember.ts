import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { groupMembers } from "../db/tables/groupMembers";

/** Puts a person into a group; whoever is in it already stays in their role. */
export async function addMember(
  db: Db,
  { groupId, userId, role, at }: { groupId: string; userId: string; role: GroupRole; at: Date },
): Promise<void> {
  await db.insert(groupMembers).values({ groupId, userId, role, joinedAt: at }).onConflictDoNothing();
}
