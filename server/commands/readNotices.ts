import { and, eq, inArray, isNull } from "drizzle-orm";
import type { Db } from "../db/client";
import { notices } from "../db/tables/notices";

/** Marks notices of a person as read; null: all of them. Those of others stay as they are. */
export async function readNotices(
  db: Db,
  { userId, ids, at }: { userId: string; ids: string[] | null; at: Date },
): Promise<void> {
  const ofThese = ids === null ? undefined : inArray(notices.id, ids);
  await db
    .update(notices)
    .set({ readAt: at })
    .where(and(eq(notices.userId, userId), isNull(notices.readAt), ofThese));
}
