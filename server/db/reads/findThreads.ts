import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { Db } from "../client";
import { comments } from "../tables/comments";
import { threadReads } from "../tables/threadReads";
import { threads } from "../tables/threads";
import { users } from "../tables/users";

const resolver = alias(users, "resolver");

const threadsFor = (db: Db, actorId: string) =>
  db
    .select({
      id: threads.id,
      version: threads.version,
      cellId: threads.cellId,
      cellKind: threads.cellKind,
      cellName: threads.cellName,
      cellText: threads.cellText,
      createdBy: threads.createdBy,
      resolvedAt: threads.resolvedAt,
      resolvedById: threads.resolvedBy,
      resolvedByName: resolver.name,
      seenUntil: threadReads.seenUntil,
    })
    .from(threads)
    .leftJoin(resolver, eq(resolver.id, threads.resolvedBy))
    .leftJoin(threadReads, and(eq(threadReads.threadId, threads.id), eq(threadReads.userId, actorId)));

/** With its comments, the oldest first. */
async function withComments<Row extends { id: string }>(db: Db, rows: Row[]) {
  if (rows.length === 0) return [];
  const found = await db
    .select({
      id: comments.id,
      threadId: comments.threadId,
      authorId: comments.authorId,
      authorName: users.name,
      text: comments.text,
      mentions: comments.mentions,
      createdAt: comments.createdAt,
      editedAt: comments.editedAt,
      deletedAt: comments.deletedAt,
    })
    .from(comments)
    .innerJoin(users, eq(users.id, comments.authorId))
    .where(
      inArray(
        comments.threadId,
        rows.map(({ id }) => id),
      ),
    )
    .orderBy(asc(comments.createdAt), asc(comments.id));
  return rows.map((row) => ({ ...row, comments: found.filter(({ threadId }) => threadId === row.id) }));
}

/** The threads of the draft, or of a kept version, the oldest first, with how far the actor has read each. */
export async function listThreads(
  db: Db,
  { notebookId, version, actorId }: { notebookId: string; version: number | null; actorId: string },
) {
  const ofVersion = version === null ? isNull(threads.version) : eq(threads.version, version);
  const rows = await threadsFor(db, actorId)
    .where(and(eq(threads.notebookId, notebookId), ofVersion))
    .orderBy(asc(threads.createdAt), asc(threads.id));
  return withComments(db, rows);
}

/** A thread of this notebook; one of another is not found. */
export async function findThread(
  db: Db,
  { notebookId, threadId, actorId }: { notebookId: string; threadId: string; actorId: string },
) {
  const rows = await threadsFor(db, actorId).where(
    and(eq(threads.notebookId, notebookId), eq(threads.id, threadId)),
  );
  const [found] = await withComments(db, rows);
  return found;
}

export type ThreadRow = NonNullable<Awaited<ReturnType<typeof findThread>>>;
export type CommentRow = ThreadRow["comments"][number];
