import type { Note, NoteLevel } from "../../../../shared/notebook/result";

export interface WorstNotes {
  level: NoteLevel;
  count: number;
}

const levels: readonly NoteLevel[] = ["fault", "caution", "remark"];

/** The gravest level among notes and how many there are of it; null where there are none. */
export function worstNotes(notes: readonly Note[]): WorstNotes | null {
  for (const level of levels) {
    const count = notes.filter((note) => note.level === level).length;
    if (count > 0) return { level, count };
  }
  return null;
}
