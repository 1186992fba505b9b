/** What its author can do to a comment: write it anew, or delete it. */
import { and, eq, isNull } from "drizzle-orm";
import type { Person } from "../../shared/schemas/people";
import type { Db } from "../db/client";
import { comments } from "../db/tables/comments";
import { notices } from "../db/tables/notices";
import { threads } from "../db/tables/threads";
import { notFound } from "../errors";
import { lockThread } from "./lockThread";
import { tellOfComment, type CommentNotice } from "./tellOfComment";

interface CommentChange {
  notebookId: string;
  threadId: string;
  commentId: string;
  at: Date;
}

const standing = ({ threadId, commentId }: CommentChange) =>
  and(eq(comments.id, commentId), eq(comments.threadId, threadId), isNull(comments.deletedAt));

/** @throws AppError if the comment is gone by now */
export async function editComment(
  db: Db,
  {
    text,
    mentions,
    told,
    ...change
  }: CommentChange & {
    text: string;
    mentions: Person[];
    told: readonly CommentNotice[];
  },
): Promise<void> {
  const { commentId, at } = change;
  await db.transaction(async (tx) => {
    await lockThread(tx, change);
    const edited = await tx
      .update(comments)
      .set({ text, mentions, editedAt: at })
      .where(standing(change))
      .returning({ id: comments.id });
    if (edited.length === 0) throw notFound("comment");
    await tellOfComment(tx, { commentId, told, at });
  });
}

/** The text goes and its place stays; a thread in which nothing is left to read goes with it. */
export async function deleteComment(db: Db, change: CommentChange): Promise<void> {
  const { threadId, commentId, at } = change;
  await db.transaction(async (tx) => {
    await lockThread(tx, change);
    const deleted = await tx
      .update(comments)
      .set({ text: "", mentions: [], deletedAt: at })
      .where(standing(change))
      .returning({ id: comments.id });
    if (deleted.length === 0) throw notFound("comment");
    await tx.delete(notices).where(eq(notices.commentId, commentId));
    const left = await tx
      .select({ id: comments.id })
      .from(comments)
      .where(and(eq(comments.threadId, threadId), isNull(comments.deletedAt)))
      .limit(1);
    if (left.length === 0) await tx.delete(threads).where(eq(threads.id, threadId));
  });
}
