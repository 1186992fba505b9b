import type { DraftState, NotebookListItem, NotebookResponse } from "../../shared/schemas/notebooks";
import type { NotebookRow } from "../db/reads/findNotebook";
import type { NotebookListRow } from "../db/reads/listNotebooks";
import type { Actor } from "../policies/actor";
import { notebookAbilitiesOf, notebookRoleOf, type NotebookFacts } from "../policies/notebookPolicy";

type Head = Pick<NotebookRow, keyof NotebookListRow & keyof NotebookRow>;

/** What decides about a notebook, out of its row. */
export function notebookFacts(row: Head): NotebookFacts {
  return {
    ownerId: row.ownerId,
    isDeleted: row.deletedAt !== null,
    isArchived: row.archivedAt !== null,
    shareRole: row.shareRole,
    groupRole: row.groupRole,
    actorGroupRole: row.actorGroupRole,
    vetting: null,
  };
}

/** Members of the wire shape that a list and a page share. */
function presentHead(row: Head, actor: Actor) {
  const facts = notebookFacts(row);
  const role = notebookRoleOf(actor, facts);
  if (role === null) throw new Error(`Notebook ${row.id} was presented to someone without a part in it`);
  return {
    id: row.id,
    title: row.title,
    owner: { id: row.ownerId, name: row.ownerName },
    group:
      row.groupId !== null && row.groupName !== null && row.groupCode !== null
        ? { id: row.groupId, name: row.groupName, code: row.groupCode }
        : null,
    role,
    revision: row.revision,
    savedAt: row.savedAt.toISOString(),
    lastVersion: row.lastVersion === 0 ? null : row.lastVersion,
    isArchived: facts.isArchived,
    abilities: notebookAbilitiesOf(actor, facts),
  };
}

/** The draft alone, for an answer that it has moved on. */
export function draftStateOf(row: NotebookRow): DraftState {
  return {
    revision: row.revision,
    document: row.document,
    savedAt: row.savedAt.toISOString(),
    savedBy: { id: row.savedById, name: row.savedByName },
  };
}

export function presentNotebook(row: NotebookRow, actor: Actor): NotebookResponse {
  return {
    ...presentHead(row, actor),
    sharedWith: row.sharedWith,
    savedBy: { id: row.savedById, name: row.savedByName },
    document: row.document,
  };
}

export function presentNotebookListItem(row: NotebookListRow, actor: Actor): NotebookListItem {
  return {
    ...presentHead(row, actor),
    coAuthors: row.coAuthors,
    summary: row.summary,
    deletedAt: row.deletedAt?.toISOString() ?? null,
  };
}
