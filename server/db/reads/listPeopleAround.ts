import { and, asc, eq, inArray, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { users } from "../tables/users";

const ownMembership = alias(groupMembers, "own_membership");

/**
 * People whom somebody may think of in a notebook, by name: its owner, those it is shared with, the members of its group
 * and of the actor's groups; each with what decides whether they may see it, which is for the policy.
 */
export async function listPeopleAround(
  db: Db,
  { notebookId, groupId, actorId }: { notebookId: string; groupId: string | null; actorId: string },
) {
  const ownGroups = db
    .select({ id: ownMembership.groupId })
    .from(ownMembership)
    .where(eq(ownMembership.userId, actorId));
  const colleagues = db
    .select({ id: groupMembers.userId })
    .from(groupMembers)
    .where(
      groupId === null
        ? inArray(groupMembers.groupId, ownGroups)
        : or(eq(groupMembers.groupId, groupId), inArray(groupMembers.groupId, ownGroups)),
    );
  const owner = db.select({ id: notebooks.ownerId }).from(notebooks).where(eq(notebooks.id, notebookId));
  const memberOf = alias(groupMembers, "member_of");
  return db
    .select({
      id: users.id,
      name: users.name,
      email: users.email,
      shareRole: notebookShares.role,
      actorGroupRole: memberOf.role,
    })
    .from(users)
    .leftJoin(
      notebookShares,
      and(eq(notebookShares.notebookId, notebookId), eq(notebookShares.userId, users.id)),
    )
    .leftJoin(
      memberOf,
      groupId === null ? sql`false` : and(eq(memberOf.groupId, groupId), eq(memberOf.userId, users.id)),
    )
    .where(
      or(sql`${notebookShares.userId} is not null`, inArray(users.id, owner), inArray(users.id, colleagues)),
    )
    .orderBy(asc(users.name), asc(users.id));
}

export type PersonAroundRow = Awaited<ReturnType<typeof listPeopleAround>>[number];
