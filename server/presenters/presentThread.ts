import type { Comment, Thread } from "../../shared/schemas/comments";
import type { CommentRow, ThreadRow } from "../db/reads/findThreads";
import type { NotebookRow } from "../db/reads/findNotebook";
import type { Actor } from "../policies/actor";
import { mayResolve } from "../policies/threadPolicy";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "./presentNotebook";

export function presentThread(row: ThreadRow, notebook: NotebookRow, actor: Actor): Thread {
  const facts = notebookFacts(notebook);
  const { resolvedAt, resolvedById, resolvedByName } = row;
  const canComment = notebookPolicy.comment(actor, facts);
  return {
    id: row.id,
    version: row.version,
    cell: { id: row.cellId, kind: row.cellKind, name: row.cellName, text: row.cellText },
    comments: row.comments.map((comment) => presentComment(comment, row.seenUntil, actor, canComment)),
    resolved:
      resolvedAt !== null && resolvedById !== null && resolvedByName !== null
        ? { by: { id: resolvedById, name: resolvedByName }, at: resolvedAt.toISOString() }
        : null,
    abilities: {
      reply: canComment,
      resolve: mayResolve(actor, facts, { begunBy: row.createdBy }),
    },
  };
}

function presentComment(row: CommentRow, seenUntil: Date | null, actor: Actor, canComment: boolean): Comment {
  const isOwn = row.authorId === actor.id;
  const isDeleted = row.deletedAt !== null;
  return {
    id: row.id,
    author: { id: row.authorId, name: row.authorName },
    text: row.text,
    mentions: row.mentions,
    createdAt: row.createdAt.toISOString(),
    editedAt: isDeleted ? null : (row.editedAt?.toISOString() ?? null),
    isDeleted,
    isUnread: !isOwn && !isDeleted && (seenUntil === null || row.createdAt > seenUntil),
    abilities: { edit: isOwn && !isDeleted && canComment },
  };
}
