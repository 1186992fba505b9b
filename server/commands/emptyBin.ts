import { and, eq, lt } from "drizzle-orm";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";

/** Days that a deleted notebook can be taken back. */
export const binDays = 30;

/**
 * Removes for good, with their versions, the notebooks whose days in the bin are over; what a reference rests on stays.
 * Answers how many.
 */
export async function emptyBin(db: Db, { at }: { at: Date }): Promise<number> {
  const before = new Date(at.getTime() - binDays * 86_400_000);
  const gone = await db
    .delete(notebooks)
    .where(and(lt(notebooks.deletedAt, before), eq(notebooks.isReferenced, false)))
    .returning({ id: notebooks.id });
  return gone.length;
}
