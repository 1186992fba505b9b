import { and, eq, isNull } from "drizzle-orm";
import type { DraftState } from "../../shared/schemas/notebooks";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { users } from "../db/tables/users";
import { archived, notFound } from "../errors";

/**
 * The draft as it is, with its row locked until the transaction ends: two who write at once come one after the other.
 *
 * @throws AppError if the notebook is gone, in the bin or archived
 */
export async function lockDraft(
  tx: Db,
  notebookId: string,
): Promise<{ current: DraftState; lastVersion: number }> {
  // Without a join: after waiting for the lock, a joined row would be the one from before the wait.
  const [draft] = await tx
    .select({
      revision: notebooks.revision,
      document: notebooks.document,
      savedAt: notebooks.savedAt,
      savedBy: notebooks.savedBy,
      lastVersion: notebooks.lastVersion,
      archivedAt: notebooks.archivedAt,
    })
    .from(notebooks)
    .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
    .for("update");
  if (!draft) throw notFound("notebook");
  if (draft.archivedAt !== null) throw archived();

  const [saver] = await tx
    .select({ id: users.id, name: users.name })
    .from(users)
    .where(eq(users.id, draft.savedBy));
  const { revision, document, savedAt, lastVersion } = draft;
  return { current: { revision, document, savedAt: savedAt.toISOString(), savedBy: saver! }, lastVersion };
}
