import { and, eq, isNull, lt, ne, or } from "drizzle-orm";
import type { Db } from "../client";
import { notebooks } from "../tables/notebooks";

/** The draft as it is now; undefined where the notebook is gone. */
export async function findDraft(db: Db, notebookId: string) {
  const [draft] = await db
    .select({ revision: notebooks.revision, document: notebooks.document, savedBy: notebooks.savedBy })
    .from(notebooks)
    .where(eq(notebooks.id, notebookId));
  return draft;
}

/** Ids of the notebooks whose summary is missing, older than the draft, or of another engine than this. */
export async function listDraftsToSummarise(db: Db, engine: string): Promise<string[]> {
  const isBehind = or(
    lt(notebooks.summaryRevision, notebooks.revision),
    isNull(notebooks.summaryEngine),
    ne(notebooks.summaryEngine, engine),
  );
  const drafts = await db
    .select({ id: notebooks.id })
    .from(notebooks)
    .where(and(isNull(notebooks.deletedAt), isBehind));
  return drafts.map(({ id }) => id);
}
