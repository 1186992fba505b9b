import type { Comment, Thread } from "../../../../../shared/schemas/comments";

export const tamsin = { id: "t", name: "Tamsin Orevale" };
export const wiremu = { id: "w", name: "Wiremu Castellane" };

export function aComment(change: Partial<Comment> = {}): Comment {
  return {
    id: "first",
    author: wiremu,
    text: "Is it *measured*?",
    mentions: [],
    createdAt: "2026-11-30T09:15:00.000Z",
    editedAt: null,
    isDeleted: false,
    isUnread: false,
    abilities: { edit: false },
    ...change,
  };
}

/** A thread of one comment on the column of `aNotebook`. */
export function aThread({
  cellId = "air",
  isUnread = false,
  ...change
}: Partial<Thread> & { cellId?: string; isUnread?: boolean } = {}): Thread {
  return {
    id: "11111111-0000-4000-8000-000000000000",
    version: null,
    cell: { id: cellId, kind: "column", name: "dayside", text: "base = 80 km" },
    comments: [aComment({ isUnread })],
    resolved: null,
    abilities: { reply: true, resolve: true },
    ...change,
  };
}
