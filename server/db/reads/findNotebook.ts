import { eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { users } from "../tables/users";
import { membershipOf, notebookHeadColumns, owner, shareOf } from "./notebookHead";

const saver = alias(users, "saver");

/** Everyone but the owner whom a share, in person or with the group, lets in. */
const sharedWith = sql<number>`(
  select count(*) from (
    select user_id from notebook_shares where notebook_id = ${notebooks.id}
    union
    select user_id from group_members where group_id = ${notebooks.groupId} and ${notebooks.groupRole} is not null
  ) as people where user_id <> ${notebooks.ownerId}
)`.mapWith(Number);

/** A notebook with its draft, in the bin or not, and what decides about this actor; whether they may see it is for the policy. */
export async function findNotebook(db: Db, id: string, actorId: string) {
  const [notebook] = await db
    .select({
      ...notebookHeadColumns,
      document: notebooks.document,
      savedById: notebooks.savedBy,
      savedByName: saver.name,
      sharedWith,
    })
    .from(notebooks)
    .innerJoin(owner, eq(owner.id, notebooks.ownerId))
    .innerJoin(saver, eq(saver.id, notebooks.savedBy))
    .leftJoin(groups, eq(groups.id, notebooks.groupId))
    .leftJoin(notebookShares, shareOf(actorId))
    .leftJoin(groupMembers, membershipOf(actorId))
    .where(eq(notebooks.id, id));
  return notebook;
}

export type NotebookRow = NonNullable<Awaited<ReturnType<typeof findNotebook>>>;
