/** What becomes of a member's notebooks when they leave a group. */
import { and, asc, count, eq, ne } from "drizzle-orm";
import type { Person } from "../../../shared/schemas/people";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { notebooks } from "../tables/notebooks";
import { users } from "../tables/users";

/** How many notebooks of a group a member owns, whatever their state. */
export async function countMembersNotebooks(db: Db, groupId: string, userId: string): Promise<number> {
  const [owned] = await db
    .select({ notebooks: count() })
    .from(notebooks)
    .where(and(eq(notebooks.groupId, groupId), eq(notebooks.ownerId, userId)));
  return owned?.notebooks ?? 0;
}

/** The lead who gets them: the one who removes the member; or, where a member leaves, the longest in the group. */
export async function findHeir(
  db: Db,
  { groupId, userId, actorId }: { groupId: string; userId: string; actorId: string },
): Promise<Person> {
  const [heir] = await db
    .select({ id: users.id, name: users.name })
    .from(groupMembers)
    .innerJoin(users, eq(users.id, groupMembers.userId))
    .where(
      and(
        eq(groupMembers.groupId, groupId),
        eq(groupMembers.role, "lead"),
        actorId === userId ? ne(users.id, userId) : eq(users.id, actorId),
      ),
    )
    .orderBy(asc(groupMembers.joinedAt), asc(users.id))
    .limit(1);
  if (!heir) throw new Error(`Group ${groupId} has no lead to take a member's notebooks over`);
  return heir;
}
