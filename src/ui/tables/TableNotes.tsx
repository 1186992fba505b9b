import type { Note } from "../../../shared/notebook/result";
import { formatMessage } from "../../lib/formatMessage";
import { Rich } from "../../lib/Rich";
import { StateMark } from "../StateMark";
import { TextButton } from "../TextButton";
import type { LetteredNote } from "./tableProps";

interface TableNotesProps {
  notes: readonly LetteredNote[];
  onRemedy?: (note: Note) => void;
}

const gravity = { fault: 0, caution: 1, remark: 2 };

/** Notes under a table: mark, letter, sentence, remedy; faults first. */
export function TableNotes({ notes, onRemedy }: TableNotesProps) {
  if (notes.length === 0) return null;
  const sorted = [...notes].sort((a, b) => gravity[a.note.level] - gravity[b.note.level]);
  return (
    <ul className="table-notes">
      {sorted.map(({ note, letter }) => (
        <li key={`${note.code}${note.message}`}>
          <StateMark state={note.level} label={note.level} />
          {letter !== null && (
            <i className="table-letter" data-level={note.level}>
              {letter}
            </i>
          )}
          <span>
            <Rich text={formatMessage(note.message)} />
            {note.remedy && onRemedy && (
              <>
                {" "}
                <TextButton onClick={() => onRemedy(note)}>{note.remedy.label}</TextButton>
              </>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
