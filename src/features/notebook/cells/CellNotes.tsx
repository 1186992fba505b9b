import type { Cell } from "../../../../shared/notebook/document";
import { StateMark } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import { NoteText } from "./NoteText";
import type { CellCommands } from "./useCellCommands";

interface CellNotesProps {
  notes: readonly LetteredNote[];
  cell: Cell;
  isEditable: boolean;
  commands: CellCommands;
}

/** Notes of a cell that stand under no entry of it: what the results themselves have to say. */
export function CellNotes({ notes, cell, isEditable, commands }: CellNotesProps) {
  const free = notes.filter(({ note }) => !isUnderEntry(note));
  // The table of an escape cell carries its notes itself.
  if (free.length === 0 || cell.kind === "escape") return null;
  return (
    <ul className="cell-notes">
      {free.map(({ note, letter }, index) => (
        <li key={index}>
          <StateMark state={note.level} label={note.level} />
          {letter && (
            <i className="note-letter" data-level={note.level}>
              {letter}
            </i>
          )}
          <span>
            <NoteText message={note.message} />{" "}
            {note.remedy && isEditable && (
              <TextButton onClick={() => commands.write(cell.id, remedied(cell.text, note.remedy!))}>
                {note.remedy.label}
              </TextButton>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}

/** Faults and cautions about an entry stand under it, in the editor. */
function isUnderEntry({ level, range, line }: LetteredNote["note"]): boolean {
  return level !== "remark" && (range !== undefined || line !== undefined);
}

function remedied(text: string, { range, replacement }: NonNullable<LetteredNote["note"]["remedy"]>): string {
  return text.slice(0, range.from) + replacement + text.slice(range.to);
}
