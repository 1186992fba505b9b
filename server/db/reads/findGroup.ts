import { and, asc, count, eq, sql } from "drizzle-orm";
import type { GroupRole } from "../../../shared/schemas/roles";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { users } from "../tables/users";

export interface GroupRow {
  id: string;
  name: string;
  code: string;
  createdAt: Date;
  members: number;
  leads: number;
  /** Of the person who asks; null outside. */
  actorRole: GroupRole | null;
}

export interface GroupMemberRow {
  userId: string;
  name: string;
  role: GroupRole;
  joinedAt: Date;
}

const groupColumns = (actorId: string) => ({
  id: groups.id,
  name: groups.name,
  code: groups.code,
  createdAt: groups.createdAt,
  members: count(groupMembers.userId),
  leads: sql<number>`count(*) filter (where ${groupMembers.role} = 'lead')`.mapWith(Number),
  actorRole: sql<GroupRole | null>`max(${groupMembers.role}) filter (where ${groupMembers.userId} = ${actorId})`,
});

/** A group as one person sees it. */
export async function findGroup(db: Db, id: string, actorId: string): Promise<GroupRow | undefined> {
  const [group] = await db
    .select(groupColumns(actorId))
    .from(groups)
    .leftJoin(groupMembers, eq(groupMembers.groupId, groups.id))
    .where(eq(groups.id, id))
    .groupBy(groups.id);
  return group;
}

/** The groups that a person belongs to, by name. */
export async function listGroups(db: Db, actorId: string): Promise<GroupRow[]> {
  return db
    .select(groupColumns(actorId))
    .from(groups)
    .innerJoin(groupMembers, eq(groupMembers.groupId, groups.id))
    .groupBy(groups.id)
    .having(sql`bool_or(${groupMembers.userId} = ${actorId})`)
    .orderBy(asc(groups.name), asc(groups.code));
}

/** Leads first, then researchers, then guests; by name within. */
export async function listGroupMembers(db: Db, groupId: string): Promise<GroupMemberRow[]> {
  return db
    .select({
      userId: groupMembers.userId,
      name: users.name,
      role: groupMembers.role,
      joinedAt: groupMembers.joinedAt,
    })
    .from(groupMembers)
    .innerJoin(users, eq(users.id, groupMembers.userId))
    .where(eq(groupMembers.groupId, groupId))
    .orderBy(
      sql`array_position(array['lead', 'researcher', 'guest'], ${groupMembers.role})`,
      asc(users.name),
    );
}

export async function findMembership(
  db: Db,
  groupId: string,
  userId: string,
): Promise<GroupRole | undefined> {
  const [membership] = await db
    .select({ role: groupMembers.role })
    .from(groupMembers)
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.userId, userId)));
  return membership?.role;
}
