import { and, eq, inArray, isNull, lte, sql } from "drizzle-orm";
import type { Db } from "../db/client";
import { comments } from "../db/tables/comments";
import { notices } from "../db/tables/notices";
import { threadReads } from "../db/tables/threadReads";

/** A person has read a thread up to a moment; their notices of what they have read there are read with it. */
export async function markSeen(
  db: Db,
  seen: { threadId: string; userId: string; until: Date; at: Date },
): Promise<void> {
  const { threadId, userId, until, at } = seen;
  await db.transaction(async (tx) => {
    await tx
      .insert(threadReads)
      .values({ threadId, userId, seenUntil: until })
      .onConflictDoUpdate({
        target: [threadReads.threadId, threadReads.userId],
        set: { seenUntil: sql`greatest(${threadReads.seenUntil}, excluded.seen_until)` },
      });
    const read = tx
      .select({ id: comments.id })
      .from(comments)
      .where(and(eq(comments.threadId, threadId), lte(comments.createdAt, until)));
    await tx
      .update(notices)
      .set({ readAt: at })
      .where(and(eq(notices.userId, userId), isNull(notices.readAt), inArray(notices.commentId, read)));
  });
}
