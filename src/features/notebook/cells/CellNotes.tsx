import type { Cell } from "../../../../shared/notebook/document";
import type { Note } from "../../../../shared/notebook/result";
import { TableNotes } from "../../../ui/tables/TableNotes";
import type { LetteredNote } from "../../../ui/tables/tableProps";

interface CellNotesProps {
  notes: readonly LetteredNote[];
  cell: Cell;
  /** null where the notebook is only read. */
  onRemedy: ((note: Note) => void) | undefined;
}

/** Notes of a cell that stand under no entry of it: what the results themselves have to say. */
export function CellNotes({ notes, cell, onRemedy }: CellNotesProps) {
  // The table of an escape cell carries its notes itself, once there is one.
  if (cell.kind === "escape") return null;
  return <TableNotes notes={notes.filter(({ note }) => !isUnderEntry(note))} onRemedy={onRemedy} />;
}

/** Faults and cautions about an entry stand under it, in the editor. */
function isUnderEntry({ level, range, line }: Note): boolean {
  return level !== "remark" && (range !== undefined || line !== undefined);
}
