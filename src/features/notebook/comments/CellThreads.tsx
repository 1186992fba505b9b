import { use } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import { cellTitle } from "../cells/cellTitle";
import { useMediaQuery } from "../page/useMediaQuery";
import { CommentForm } from "./CommentForm";
import { CommentsContext, type Comments } from "./commentsContext";
import type { KeyedThread } from "./keyedThreads";
import { noMargin } from "./noMargin";
import { ThreadView } from "./ThreadView";

/** Under a cell where the page has no margin: its threads. */
export function CellThreads({ cell }: { cell: Cell }) {
  const comments = use(CommentsContext);
  const isNarrow = useMediaQuery(noMargin);
  if (!comments || !isNarrow) return null;
  const threads = comments.threads.filter((keyed) => keyed.cell?.id === cell.id);
  const isWriting = comments.writingOn === cell.id;
  if (threads.length === 0 && !isWriting) return null;
  return (
    <aside className="cell-threads" aria-label={`Threads on ${cellTitle(cell)}`}>
      {threads.map((keyed) => (
        <ThreadIn key={keyed.thread.id} keyed={keyed} comments={comments} />
      ))}
      {isWriting && <NewThread cell={cell} comments={comments} />}
    </aside>
  );
}

/** After the last cell where the page has no margin: threads whose cells are gone. */
export function GoneThreads() {
  const comments = use(CommentsContext);
  const isNarrow = useMediaQuery(noMargin);
  const gone = comments?.threads.filter(({ cell }) => cell === null) ?? [];
  if (!comments || !isNarrow || gone.length === 0) return null;
  return (
    <aside className="cell-threads" aria-label="Threads on cells that are gone">
      {gone.map((keyed) => (
        <ThreadIn key={keyed.thread.id} keyed={keyed} comments={comments} />
      ))}
    </aside>
  );
}

export function ThreadIn({ keyed, comments }: { keyed: KeyedThread; comments: Comments }) {
  return (
    <ThreadView
      keyed={keyed}
      readers={comments.readers}
      acts={comments.acts}
      isOpened={comments.openedId === keyed.thread.id}
    />
  );
}

/** Where the first comment of a thread is written. */
export function NewThread({ cell, comments }: { cell: Cell; comments: Comments }) {
  return (
    <div className="thread">
      <CommentForm
        label={`Comment on ${cellTitle(cell)}`}
        verb="Comment"
        readers={comments.readers}
        onSend={(text) => comments.send(cell.id, text)}
        onDone={comments.end}
      />
    </div>
  );
}
