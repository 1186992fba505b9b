import { and, asc, count, eq, sql } from "drizzle-orm";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { users } from "../tables/users";

/** The people whom a notebook is shared with in person, from most to least, by name within. */
export async function listShares(db: Db, notebookId: string) {
  return db
    .select({
      userId: users.id,
      name: users.name,
      role: notebookShares.role,
      createdAt: notebookShares.createdAt,
      groupRole: groupMembers.role,
    })
    .from(notebookShares)
    .innerJoin(users, eq(users.id, notebookShares.userId))
    .innerJoin(notebooks, eq(notebooks.id, notebookShares.notebookId))
    .leftJoin(
      groupMembers,
      and(eq(groupMembers.groupId, notebooks.groupId), eq(groupMembers.userId, users.id)),
    )
    .where(eq(notebookShares.notebookId, notebookId))
    .orderBy(
      sql`array_position(array['co-author', 'commenter', 'reader'], ${notebookShares.role})`,
      asc(users.name),
    );
}

export type ShareRow = Awaited<ReturnType<typeof listShares>>[number];

export async function countMembers(db: Db, groupId: string): Promise<{ people: number; guests: number }> {
  const [counted] = await db
    .select({
      people: count(),
      guests: sql<number>`count(*) filter (where ${groupMembers.role} = 'guest')`.mapWith(Number),
    })
    .from(groupMembers)
    .where(eq(groupMembers.groupId, groupId));
  return counted ?? { people: 0, guests: 0 };
}
