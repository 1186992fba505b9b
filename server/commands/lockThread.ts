import { and, eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { threads } from "../db/tables/threads";
import { notFound } from "../errors";

/**
 * Locks a thread until the transaction ends, so that it is not removed under a reply.
 *
 * @throws AppError if it is gone
 */
export async function lockThread(
  tx: Db,
  { notebookId, threadId }: { notebookId: string; threadId: string },
): Promise<void> {
  const [thread] = await tx
    .select({ id: threads.id })
    .from(threads)
    .where(and(eq(threads.id, threadId), eq(threads.notebookId, notebookId)))
    .for("update");
  if (!thread) throw notFound("thread");
}
