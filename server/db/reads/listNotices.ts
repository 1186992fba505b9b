import { desc, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { Db } from "../client";
import { comments } from "../tables/comments";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { notices } from "../tables/notices";
import { threads } from "../tables/threads";
import { users } from "../tables/users";
import { membershipOf, notebookHeadColumns, owner, shareOf } from "./notebookHead";

const writer = alias(users, "writer");

/** The last hundred notices of a person, latest first, with what decides whether they may still see what each is about. */
export async function listNotices(db: Db, userId: string) {
  return db
    .select({
      id: notices.id,
      kind: notices.kind,
      createdAt: notices.createdAt,
      readAt: notices.readAt,
      byId: writer.id,
      byName: writer.name,
      text: comments.text,
      threadId: threads.id,
      version: threads.version,
      cellKind: threads.cellKind,
      cellName: threads.cellName,
      notebook: notebookHeadColumns,
    })
    .from(notices)
    .innerJoin(comments, eq(comments.id, notices.commentId))
    .innerJoin(writer, eq(writer.id, comments.authorId))
    .innerJoin(threads, eq(threads.id, comments.threadId))
    .innerJoin(notebooks, eq(notebooks.id, threads.notebookId))
    .innerJoin(owner, eq(owner.id, notebooks.ownerId))
    .leftJoin(groups, eq(groups.id, notebooks.groupId))
    .leftJoin(notebookShares, shareOf(userId))
    .leftJoin(groupMembers, membershipOf(userId))
    .where(eq(notices.userId, userId))
    .orderBy(desc(notices.createdAt), desc(notices.id))
    .limit(100);
}

export type NoticeRow = Awaited<ReturnType<typeof listNotices>>[number];
