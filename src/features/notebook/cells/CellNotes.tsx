import type { Cell } from "../../../../shared/notebook/document";
import type { Note } from "../../../../shared/notebook/result";
import { TableNotes } from "../../../ui/tables/TableNotes";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import type { TaskState } from "../evaluation/createTaskQueue";

interface CellNotesProps {
  notes: readonly LetteredNote[];
  cell: Cell;
  /** Says itself what the notes on long work say. */
  task: TaskState | undefined;
  /** null where the notebook is only read. */
  onRemedy: ((note: Note) => void) | undefined;
}

/** Notes of a cell that stand under no entry of it: what the results themselves have to say. */
export function CellNotes({ notes, cell, task, onRemedy }: CellNotesProps) {
  // The table of an escape cell carries its notes itself, once there is one.
  if (cell.kind === "escape") return null;
  const free = notes.filter(({ note }) => !isUnderEntry(note) && !(task && taskNotes.has(note.code)));
  return <TableNotes notes={free} onRemedy={onRemedy} />;
}

const taskNotes = new Set(["to_be_computed", "partial"]);

/** Faults and cautions about an entry stand under it, in the editor. */
function isUnderEntry({ level, range, line }: Note): boolean {
  return level !== "remark" && (range !== undefined || line !== undefined);
}
