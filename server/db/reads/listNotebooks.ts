import { and, asc, desc, eq, isNotNull, isNull, or, sql } from "drizzle-orm";
import type { Person } from "../../../shared/schemas/people";
import type { NotebookListQuery } from "../../../shared/schemas/notebooks";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { membershipOf, notebookHeadColumns, owner, shareOf } from "./notebookHead";

const coAuthors = sql<Person[]>`(
  select coalesce(json_agg(json_build_object('id', users.id, 'name', users.name) order by users.name), '[]')
  from notebook_shares as share join users on users.id = share.user_id
  where share.notebook_id = ${notebooks.id} and share.role = 'co-author'
)`;

/**
 * The notebooks that an actor has some tie to, without their documents: on the shelf, archived, or one's own in the bin.
 * Whether they may see each is for the policy.
 */
export async function listNotebooks(db: Db, actorId: string, { q, order, place }: NotebookListQuery) {
  const isMine = eq(notebooks.ownerId, actorId);
  const isTied = or(
    isMine,
    isNotNull(notebookShares.role),
    and(isNotNull(notebooks.groupRole), isNotNull(groupMembers.role)),
  );
  const isOut = isNull(notebooks.deletedAt);
  const inPlace = {
    shelf: and(isTied, isOut, isNull(notebooks.archivedAt)),
    archived: and(isTied, isOut, isNotNull(notebooks.archivedAt)),
    bin: and(isMine, isNotNull(notebooks.deletedAt)),
  };
  const sought = sql`strpos(lower(${notebooks.title} || E'\n' || ${owner.name}), lower(${q.trim()})) > 0`;

  return db
    .select({ ...notebookHeadColumns, summary: notebooks.summary, coAuthors })
    .from(notebooks)
    .innerJoin(owner, eq(owner.id, notebooks.ownerId))
    .leftJoin(groups, eq(groups.id, notebooks.groupId))
    .leftJoin(notebookShares, shareOf(actorId))
    .leftJoin(groupMembers, membershipOf(actorId))
    .where(and(inPlace[place], q.trim() === "" ? undefined : sought))
    .orderBy(
      ...(order === "title" ? [asc(sql`lower(${notebooks.title})`)] : [desc(notebooks.savedAt)]),
      asc(notebooks.id),
    );
}

export type NotebookListRow = Awaited<ReturnType<typeof listNotebooks>>[number];
