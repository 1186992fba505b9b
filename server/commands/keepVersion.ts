import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import { contentText } from "../../shared/notebook/contentText";
import type { KeptResult } from "../../shared/schemas/results";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { versions } from "../db/tables/versions";
import { staleRevision } from "../errors";
import { lockDraft } from "./lockDraft";

/**
 * Keeps the draft of a revision, with the result computed for it, as the next version.
 *
 * @throws AppError `stale_revision` with the current draft, if it has moved on
 */
export async function keepVersion(
  db: Db,
  version: {
    notebookId: string;
    revision: number;
    message: string;
    result: KeptResult;
    actorId: string;
    at: Date;
  },
): Promise<{ number: number }> {
  const { notebookId, revision, message, result, actorId, at } = version;
  return db.transaction(async (tx) => {
    const { current, lastVersion } = await lockDraft(tx, notebookId);
    if (current.revision !== revision) throw staleRevision(current);

    const number = lastVersion + 1;
    await tx.insert(versions).values({
      notebookId,
      number,
      message,
      document: current.document,
      result,
      engine: result.engine,
      contentHash: createHash("sha256").update(contentText(current.document, result.engine)).digest("hex"),
      keptAt: at,
      keptBy: actorId,
    });
    await tx.update(notebooks).set({ lastVersion: number }).where(eq(notebooks.id, notebookId));
    return { number };
  });
}
