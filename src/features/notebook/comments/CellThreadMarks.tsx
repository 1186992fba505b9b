import { use } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import { formatCount } from "../../../lib/format";
import { TextButton } from "../../../ui/TextButton";
import { cellTitle } from "../cells/cellTitle";
import { CommentsContext } from "./commentsContext";
import { unreadIn, type KeyedThread } from "./keyedThreads";

/** The keys of a cell's threads, each leading to its thread. */
export function CellThreadMarks({ cell }: { cell: Cell }) {
  const comments = use(CommentsContext);
  const threads = comments?.threads.filter((keyed) => keyed.cell?.id === cell.id) ?? [];
  if (!comments || threads.length === 0) return null;
  return (
    <span className="thread-marks" data-print="never">
      {threads.map((keyed) => (
        <button
          key={keyed.thread.id}
          type="button"
          className="thread-mark"
          data-unread={unreadIn(keyed.thread) > 0 || undefined}
          data-resolved={keyed.thread.resolved !== null || undefined}
          aria-label={markWords(keyed, cell)}
          onClick={() => comments.open(keyed.thread.id)}
        >
          {keyed.key}
        </button>
      ))}
    </span>
  );
}

/** The word that begins a thread on a cell. */
export function CommentWord({ cell, className = "" }: { cell: Cell; className?: string }) {
  const comments = use(CommentsContext);
  if (!comments?.canComment) return null;
  return (
    <TextButton
      className={className}
      data-print="never"
      aria-label={`Comment on ${cellTitle(cell)}`}
      onClick={() => comments.begin(cell.id)}
    >
      comment
    </TextButton>
  );
}

function markWords({ thread, key }: KeyedThread, cell: Cell): string {
  const unread = unreadIn(thread);
  const facts = [
    `Thread ${key} on ${cellTitle(cell)}`,
    formatCount(thread.comments.length, "comment"),
    ...(unread > 0 ? [formatCount(unread, "new", "new")] : []),
    ...(thread.resolved ? ["resolved"] : []),
  ];
  return facts.join(", ");
}
