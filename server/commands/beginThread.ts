import { count, eq } from "drizzle-orm";
import type { Cell } from "../../shared/notebook/document";
import { commentLimits } from "../../shared/schemas/comments";
import type { Person } from "../../shared/schemas/people";
import type { Db } from "../db/client";
import { comments } from "../db/tables/comments";
import { threads } from "../db/tables/threads";
import { conflict } from "../errors";
import { tellOfComment, type CommentNotice } from "./tellOfComment";

/**
 * Begins a thread on a cell with its first comment, and keeps what the cell said.
 *
 * @throws AppError if the notebook has as many threads as it may
 */
export async function beginThread(
  db: Db,
  thread: {
    threadId: string;
    notebookId: string;
    version: number | null;
    cell: Cell;
    text: string;
    mentions: Person[];
    told: readonly CommentNotice[];
    actorId: string;
    at: Date;
  },
): Promise<void> {
  const { threadId, notebookId, version, cell, text, mentions, told, actorId, at } = thread;
  await db.transaction(async (tx) => {
    const [counted] = await tx
      .select({ threads: count() })
      .from(threads)
      .where(eq(threads.notebookId, notebookId));
    if (counted!.threads >= commentLimits.threads) {
      throw conflict(
        "too_many_threads",
        `This notebook has ${commentLimits.threads} threads, which is as many as it may have. Reply in one of them.`,
      );
    }
    await tx.insert(threads).values({
      id: threadId,
      notebookId,
      version,
      cellId: cell.id,
      cellKind: cell.kind,
      cellName: cell.name,
      cellText: beginningOf(cell.text),
      createdAt: at,
      createdBy: actorId,
    });
    const [written] = await tx
      .insert(comments)
      .values({ threadId, authorId: actorId, text, mentions, createdAt: at })
      .returning({ id: comments.id });
    await tellOfComment(tx, { commentId: written!.id, told, at });
  });
}

/** Cut between characters, never within one. */
const beginningOf = (text: string): string =>
  text.length <= commentLimits.quoted ? text : Array.from(text).slice(0, commentLimits.quoted).join("");
