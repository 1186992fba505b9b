import type { Db } from "../db/client";
import { findNotebook, type NotebookRow } from "../db/reads/findNotebook";
import { notFound } from "../errors";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";

/**
 * A notebook that the actor may see; or, `orInBin`, may take out of the bin.
 *
 * @throws AppError if there is none: what one may not see does not exist
 */
export async function loadNotebook(
  db: Db,
  id: string,
  actor: Actor,
  { orInBin }: { orInBin: boolean } = { orInBin: false },
): Promise<NotebookRow> {
  const notebook = await findNotebook(db, id, actor.id);
  if (!notebook) throw notFound("notebook");
  const facts = notebookFacts(notebook);
  const isSeen =
    notebookPolicy.read(actor, facts) || (orInBin && notebookPolicy.restoreFromBin(actor, facts));
  if (!isSeen) throw notFound("notebook");
  return notebook;
}
