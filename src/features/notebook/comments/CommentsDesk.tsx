import { useQuery } from "@tanstack/react-query";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { useLocation } from "react-router-dom";
import type { Cell } from "../../../../shared/notebook/document";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { Thread } from "../../../../shared/schemas/comments";
import { cellTitle } from "../cells/cellTitle";
import { readersQuery, threadsQuery, useThreadActs } from "./commentQueries";
import "./comments.css";
import { CommentsContext, type Comments } from "./commentsContext";
import { keyThreads } from "./keyedThreads";

interface CommentsDeskProps {
  notebook: NotebookResponse;
  /** null: the draft. */
  version: number | null;
  cells: readonly Cell[];
  /** Saves what waits, so that a cell just written can be spoken of. */
  flush?: () => Promise<unknown>;
  children: React.ReactNode;
}

/** Gives the page its threads: which there are, which is open, and where one is being begun. */
export function CommentsDesk({ notebook, version, cells, flush, children }: CommentsDeskProps) {
  const { id } = notebook;
  const found = useQuery(threadsQuery(id, version)).data;
  const canComment = notebook.abilities.comment;
  const readers = useQuery({ ...readersQuery(id), enabled: canComment }).data;
  const acts = useThreadActs(id, version);
  const [writingOn, setWritingOn] = useState<string | null>(null);
  const [openedId, setOpenedId] = useState<string | null>(null);
  const threads = useMemo(() => keyThreads(found ?? [], cells), [found, cells]);

  const open = useCallback((threadId: string) => {
    setOpenedId(threadId);
    goTo(threadId);
  }, []);
  useLinkedThread(threads.length > 0, open);

  const { mutateAsync: beginThread } = acts.begin;
  const send = useCallback(
    async (cellId: string, text: string) => {
      await flush?.();
      return beginThread({ cellId, text });
    },
    [flush, beginThread],
  );
  const comments: Comments = {
    threads,
    readers: readers ?? [],
    acts,
    canComment,
    writingOn,
    openedId,
    begin: setWritingOn,
    end: () => setWritingOn(null),
    send,
    open,
  };

  return (
    <CommentsContext value={comments}>
      {children}
      <NewComments threads={found} cells={cells} />
    </CommentsContext>
  );
}

/** Once what shows the thread has been drawn. */
function goTo(threadId: string): void {
  requestAnimationFrame(() => {
    const element = document.getElementById(`thread-${threadId}`);
    element?.scrollIntoView({ block: "nearest" });
    element?.focus({ preventScroll: true });
  });
}

/** Goes to the thread that the address names, once it is there. */
function useLinkedThread(hasThreads: boolean, open: (threadId: string) => void): void {
  const { hash } = useLocation();
  useEffect(
    function followLink() {
      const [, threadId] = /^#thread-([0-9a-f-]{36})$/.exec(hash) ?? [];
      if (!hasThreads || threadId === undefined) return;
      // Cells take their heights as they are drawn; a moment later the thread stands where it stays.
      const timer = setTimeout(() => open(threadId), 400);
      return () => clearTimeout(timer);
    },
    [hash, hasThreads, open],
  );
}

/** Says aloud what others have written since the page was opened. */
function NewComments({ threads, cells }: { threads: Thread[] | undefined; cells: readonly Cell[] }) {
  const known = useRef<Set<string> | null>(null);
  const [words, setWords] = useState("");
  useEffect(
    function noticeNewOnes() {
      if (!threads) return;
      const before = known.current;
      known.current = new Set(threads.flatMap(({ comments }) => comments.map((comment) => comment.id)));
      if (before === null) return;
      for (const { comments, cell } of threads) {
        const fresh = comments.find((comment) => comment.isUnread && !before.has(comment.id));
        const now = cells.find((one) => one.id === cell.id);
        if (fresh) setWords(`${fresh.author.name} wrote a comment on ${now ? cellTitle(now) : cell.name}.`);
      }
    },
    [threads, cells],
  );
  return (
    <p className="visually-hidden" role="status">
      {words}
    </p>
  );
}
