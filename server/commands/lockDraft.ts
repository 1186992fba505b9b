import { and, eq, isNull } from "drizzle-orm";
import type { DraftState } from "../../shared/schemas/notebooks";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { users } from "../db/tables/users";
import { notFound } from "../errors";

/**
 * The draft as it is, with its row locked until the transaction ends: two who write at once come one after the other.
 *
 * @throws AppError if the notebook is gone or in the bin
 */
export async function lockDraft(
  tx: Db,
  notebookId: string,
): Promise<{ current: DraftState; lastVersion: number }> {
  const [draft] = await tx
    .select({
      revision: notebooks.revision,
      document: notebooks.document,
      savedAt: notebooks.savedAt,
      savedById: notebooks.savedBy,
      savedByName: users.name,
      lastVersion: notebooks.lastVersion,
    })
    .from(notebooks)
    .innerJoin(users, eq(users.id, notebooks.savedBy))
    .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
    .for("update", { of: notebooks });
  if (!draft) throw notFound("notebook");
  return {
    current: {
      revision: draft.revision,
      document: draft.document,
      savedAt: draft.savedAt.toISOString(),
      savedBy: { id: draft.savedById, name: draft.savedByName },
    },
    lastVersion: draft.lastVersion,
  };
}
