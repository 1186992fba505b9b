import { and, eq, lte } from "drizzle-orm";
import type { NotebookSummary } from "../../shared/notebook/summary";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";

/**
 * Stores what was computed of one revision of a draft, unless a later revision's is there. `summary` is null where
 * the computation did not come to an end: an older summary would speak of another text.
 */
export async function storeSummary(
  db: Db,
  stored: { notebookId: string; revision: number; engine: string; summary: NotebookSummary | null },
): Promise<void> {
  const { notebookId, revision, engine, summary } = stored;
  await db
    .update(notebooks)
    .set({ summary, summaryRevision: revision, summaryEngine: engine })
    .where(and(eq(notebooks.id, notebookId), lte(notebooks.summaryRevision, revision)));
}
