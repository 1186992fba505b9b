import { useEffect, useRef, useState } from "react";
import type { Person } from "../../../../shared/schemas/people";
import { failureSentence } from "../../../lib/ApiError";
import { formatCount } from "../../../lib/format";
import { useNotify } from "../../../ui/Notices";
import { TextButton } from "../../../ui/TextButton";
import { cellTitle } from "../cells/cellTitle";
import { useOnScreen } from "../cells/useOnScreen";
import { cellElement } from "../cells/useCellCommands";
import { CommentForm } from "./CommentForm";
import type { ThreadActs } from "./commentQueries";
import { CommentView } from "./CommentView";
import { unreadIn, type KeyedThread } from "./keyedThreads";
import type { Cell } from "../../../../shared/notebook/document";

interface ThreadViewProps {
  keyed: KeyedThread;
  readers: readonly Person[];
  acts: ThreadActs;
  /** Gone to by its key or by a link: unfolded though it is resolved. */
  isOpened: boolean;
}

/** So long must a new comment be on the screen before it counts as read, ms. */
const readingTime = 2_500;

/** One thread: what was said about a cell, and what can be said and done next. */
export function ThreadView({ keyed, readers, acts, isOpened }: ThreadViewProps) {
  const { thread, key, cell } = keyed;
  const [isReplying, setReplying] = useState(false);
  const [isUnfolded, setUnfolded] = useState(false);
  const notify = useNotify();
  const element = useRef<HTMLElement>(null);
  const { id: threadId, resolved } = thread;
  const isFolded = resolved !== null && !isUnfolded && !isOpened;
  useSeen(element, keyed, acts, isFolded);

  const resolve = (isResolved: boolean) =>
    acts.resolve.mutate(
      { threadId, isResolved },
      {
        onSuccess: () => setUnfolded(false),
        onError: (error) =>
          notify({ state: "fault", text: `The thread is as it was. ${failureSentence(error)}` }),
      },
    );
  const copyLink = async () => {
    const link = `${location.origin}${location.pathname}#thread-${threadId}`;
    try {
      await navigator.clipboard.writeText(link);
      notify({ state: "holds", text: `The link to thread ${key} is copied.` });
    } catch {
      notify({ state: "remark", text: `The link could not be copied here. It is ${link}` });
    }
  };

  return (
    <article
      ref={element}
      id={`thread-${threadId}`}
      className="thread"
      tabIndex={-1}
      aria-label={`Thread ${key} on ${cellTitle(cell ?? asCell(thread.cell))}`}
      onKeyDown={(event) => {
        if (event.key === "Escape" && cell) cellElement(cell.id)?.focus();
      }}
    >
      <span className="thread-key" aria-hidden="true">
        {key}
      </span>
      {resolved && (
        <p className="thread-resolved">
          Resolved by {resolved.by.name}, {formatCount(thread.comments.length, "comment")}{" "}
          <TextButton
            data-print="never"
            aria-expanded={!isFolded}
            onClick={() => setUnfolded(isFolded)}
            aria-label={`${isFolded ? "Show" : "Fold"} thread ${key}`}
          >
            {isFolded ? "show" : "fold"}
          </TextButton>
        </p>
      )}
      {!isFolded && (
        <>
          {!cell && <GoneCell keyed={keyed} />}
          <ul>
            {thread.comments.map((comment) => (
              <CommentView
                key={comment.id}
                comment={comment}
                readers={readers}
                onEdit={(text) => acts.edit.mutateAsync({ threadId, commentId: comment.id, text })}
                onDelete={() => acts.remove.mutateAsync({ threadId, commentId: comment.id })}
              />
            ))}
          </ul>
          {isReplying ? (
            <CommentForm
              label={`Reply in thread ${key}`}
              verb="Reply"
              readers={readers}
              onSend={(text) => acts.reply.mutateAsync({ threadId, text })}
              onDone={() => {
                setReplying(false);
                element.current?.focus({ preventScroll: true });
              }}
            />
          ) : (
            <div className="comment-acts" data-print="never">
              {thread.abilities.reply && (
                <TextButton aria-label={`Reply in thread ${key}`} onClick={() => setReplying(true)}>
                  Reply
                </TextButton>
              )}
              {thread.abilities.resolve && (
                <TextButton
                  aria-label={`${resolved ? "Reopen" : "Resolve"} thread ${key}`}
                  disabled={acts.resolve.isPending}
                  onClick={() => resolve(resolved === null)}
                >
                  {resolved ? "Reopen" : "Resolve"}
                </TextButton>
              )}
              <TextButton aria-label={`Copy the link to thread ${key}`} onClick={() => void copyLink()}>
                Link
              </TextButton>
            </div>
          )}
        </>
      )}
    </article>
  );
}

/** Says that the cell is gone, and keeps what it said. */
function GoneCell({ keyed: { thread } }: { keyed: KeyedThread }) {
  const { cell } = thread;
  return (
    <details className="thread-gone">
      <summary>{cellTitle(asCell(cell))} is gone. What it said</summary>
      <pre>{cell.text.trim() === "" ? "Nothing was written in it." : cell.text}</pre>
    </details>
  );
}

const asCell = ({ kind, name }: { kind: string; name: string }): Pick<Cell, "kind" | "name"> => ({
  kind: kind as Cell["kind"],
  name,
});

/** Tells the server how far a thread has been read, once its end has stood on the screen for a while. */
function useSeen(
  element: React.RefObject<HTMLElement | null>,
  { thread }: KeyedThread,
  { see }: ThreadActs,
  isFolded: boolean,
): void {
  const isOnScreen = useOnScreen(element);
  const last = thread.comments.at(-1)?.id;
  const isUnread = unreadIn(thread) > 0;
  const { mutate } = see;
  useEffect(
    function readOn() {
      if (!isOnScreen || !isUnread || isFolded || last === undefined) return;
      const timer = setTimeout(() => mutate({ threadId: thread.id, commentId: last }), readingTime);
      return () => clearTimeout(timer);
    },
    [isOnScreen, isUnread, isFolded, last, thread.id, mutate],
  );
}
