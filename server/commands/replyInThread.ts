import { count, eq } from "drizzle-orm";
import { commentLimits } from "../../shared/schemas/comments";
import type { Person } from "../../shared/schemas/people";
import type { Db } from "../db/client";
import { comments } from "../db/tables/comments";
import { conflict } from "../errors";
import { lockThread } from "./lockThread";
import { tellOfComment, type CommentNotice } from "./tellOfComment";

/**
 * Adds a comment at the end of a thread.
 *
 * @throws AppError if the thread is gone, or as long as it may be
 */
export async function replyInThread(
  db: Db,
  reply: {
    notebookId: string;
    threadId: string;
    text: string;
    mentions: Person[];
    told: readonly CommentNotice[];
    actorId: string;
    at: Date;
  },
): Promise<void> {
  const { notebookId, threadId, text, mentions, told, actorId, at } = reply;
  await db.transaction(async (tx) => {
    await lockThread(tx, { notebookId, threadId });
    const [counted] = await tx
      .select({ comments: count() })
      .from(comments)
      .where(eq(comments.threadId, threadId));
    if (counted!.comments >= commentLimits.perThread) {
      throw conflict(
        "thread_full",
        `This thread has ${commentLimits.perThread} comments, which is as many as it may have. Begin another.`,
      );
    }
    const [written] = await tx
      .insert(comments)
      .values({ threadId, authorId: actorId, text, mentions, createdAt: at })
      .returning({ id: comments.id });
    await tellOfComment(tx, { commentId: written!.id, told, at });
  });
}
