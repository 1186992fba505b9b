import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { threads } from "../db/tables/threads";
import { lockThread } from "./lockThread";

/** Resolves a thread, or opens it again. */
export async function resolveThread(
  db: Db,
  resolution: { notebookId: string; threadId: string; isResolved: boolean; actorId: string; at: Date },
): Promise<void> {
  const { threadId, isResolved, actorId, at } = resolution;
  await db.transaction(async (tx) => {
    await lockThread(tx, resolution);
    await tx
      .update(threads)
      .set(isResolved ? { resolvedAt: at, resolvedBy: actorId } : { resolvedAt: null, resolvedBy: null })
      .where(eq(threads.id, threadId));
  });
}
