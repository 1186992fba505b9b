import type { Cell } from "../../../../shared/notebook/document";
import type { Thread } from "../../../../shared/schemas/comments";

/** A thread with the mark that stands on its cell and beside it. */
export interface KeyedThread {
  thread: Thread;
  key: string;
  /** The cell it speaks of as it is now; null where it is gone. */
  cell: Cell | null;
}

/** The printers' order of notes, without the asterisk, which means a product here. */
const marks = ["†", "‡", "§", "‖", "¶"] as const;

/** † ‡ § ‖ ¶, then †† and so on. */
export function threadKey(index: number): string {
  return marks[index % marks.length]!.repeat(Math.floor(index / marks.length) + 1);
}

/** Threads in the order of their cells, the oldest first on each; at the end those whose cells are gone. */
export function keyThreads(threads: readonly Thread[], cells: readonly Cell[]): KeyedThread[] {
  const byCell = new Map(cells.map((cell, index) => [cell.id, { cell, index }]));
  const placeOf = ({ cell }: Thread): number => byCell.get(cell.id)?.index ?? cells.length;
  return [...threads]
    .sort((one, other) => placeOf(one) - placeOf(other))
    .map((thread, index) => ({
      thread,
      key: threadKey(index),
      cell: byCell.get(thread.cell.id)?.cell ?? null,
    }));
}

/** Comments that are still to be read, of those written by others. */
export const unreadIn = ({ comments }: Thread): number => comments.filter(({ isUnread }) => isUnread).length;
