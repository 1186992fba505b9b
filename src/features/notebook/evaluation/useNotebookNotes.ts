import { useMemo, useRef } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { Note, NoteLevel } from "../../../../shared/notebook/result";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import type { ListedNote } from "../page/NotesList";
import type { LiveEvaluation } from "./useEvaluation";

export interface NotebookNotes {
  /** In the order of the cells. */
  listed: readonly ListedNote[];
  /** Those of one cell; the same list for as long as it says the same. */
  of: (cellId: string) => readonly LetteredNote[];
  count: (level: NoteLevel) => number;
}

interface LetteredCell {
  notes: readonly Note[];
  firstLetter: number;
  lettered: readonly LetteredNote[];
}

const none: readonly LetteredNote[] = [];

/** Every note of a notebook, faults and cautions with a letter that counts on through the notebook. */
export function useNotebookNotes(
  document: NotebookDocument,
  { evaluated, late }: LiveEvaluation,
): NotebookNotes {
  const remembered = useRef(new Map<string, LetteredCell>());

  return useMemo(() => {
    const before = remembered.current;
    const lettered = new Map<string, LetteredCell>();
    const listed: ListedNote[] = [];
    let letter = 0;
    for (const cell of document.cells) {
      const notes = evaluated?.cells.get(cell.id)?.result.notes;
      if (!notes || late.has(cell.id)) continue;
      const last = before.get(cell.id);
      const entry =
        last && last.notes === notes && last.firstLetter === letter
          ? last
          : { notes, firstLetter: letter, lettered: withLetters(notes, letter) };
      lettered.set(cell.id, entry);
      letter += entry.lettered.filter((note) => note.letter !== null).length;
      listed.push(...entry.lettered.map((note) => ({ ...note, cell })));
    }
    remembered.current = lettered;
    return {
      listed,
      of: (cellId) => lettered.get(cellId)?.lettered ?? none,
      count: (level) => listed.filter(({ note }) => note.level === level).length,
    };
  }, [document.cells, evaluated, late]);
}

function withLetters(notes: readonly Note[], first: number): LetteredNote[] {
  let next = first;
  return notes.map((note) => ({ note, letter: note.level === "remark" ? null : letterAt(next++) }));
}

/** a to z, then aa, ab, … */
function letterAt(index: number): string {
  const letter = String.fromCharCode(97 + (index % 26));
  return index < 26 ? letter : letterAt(Math.floor(index / 26) - 1) + letter;
}
