import { createContext } from "react";
import type { Person } from "../../../../shared/schemas/people";
import type { ThreadActs } from "./commentQueries";
import type { KeyedThread } from "./keyedThreads";

/** What cells and the margin share of the threads of one page. */
export interface Comments {
  /** In the order of their cells. */
  threads: readonly KeyedThread[];
  readers: readonly Person[];
  acts: ThreadActs;
  canComment: boolean;
  /** The cell that a new thread is being written on. */
  writingOn: string | null;
  /** The thread that was gone to last. */
  openedId: string | null;
  begin: (cellId: string) => void;
  /** The new thread was written, or left. */
  end: () => void;
  /** Sends the first comment of a new thread. */
  send: (cellId: string, text: string) => Promise<unknown>;
  /** Brings a thread into view and gives it the focus. */
  open: (threadId: string) => void;
}

/** null where there are no threads to speak of: a cell shown by itself. */
export const CommentsContext = createContext<Comments | null>(null);
