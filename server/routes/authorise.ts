import type { NotebookAction } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { findGroup } from "../db/reads/findGroup";
import type { NotebookRow } from "../db/reads/findNotebook";
import { archived, forbidden, notFound } from "../errors";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";

/**
 * Lets through who may do this with a notebook. `act` completes "You may not …".
 *
 * @throws AppError if they may not; with the reason where it is only that the notebook is archived
 */
export function authorise(actor: Actor, notebook: NotebookRow, action: NotebookAction, act: string): void {
  const facts = notebookFacts(notebook);
  const rule = notebookPolicy[action];
  if (rule(actor, facts)) return;
  if (facts.isArchived && rule(actor, { ...facts, isArchived: false })) throw archived();
  throw forbidden(act);
}

/**
 * Lets through who may create notebooks in a group; null is one's own shelf.
 *
 * @throws AppError if the actor may not
 */
export async function authoriseIn(db: Db, groupId: string | null, actor: Actor): Promise<void> {
  if (groupId === null) return;
  const group = await findGroup(db, groupId, actor.id);
  if (!group || !groupPolicy.see(actor, group)) throw notFound("group");
  if (!groupPolicy.createNotebook(actor, group)) throw forbidden("create notebooks in this group");
}
