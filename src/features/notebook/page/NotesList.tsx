import type { Cell } from "../../../../shared/notebook/document";
import type { Note, NoteLevel } from "../../../../shared/notebook/result";
import { formatCount } from "../../../lib/format";
import { formatMessage } from "../../../lib/formatMessage";
import { Rich } from "../../../lib/Rich";
import { StateMark } from "../../../ui/StateMark";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import { complaintAndRest } from "../cells/complaintAndRest";

export interface ListedNote extends LetteredNote {
  cell: Pick<Cell, "id" | "name" | "kind">;
}

const levels: readonly NoteLevel[] = ["fault", "caution", "remark"];

/** In the margin: all that is wrong or doubtful in the notebook, faults first; each leads to its cell. */
export function NotesList({ notes }: { notes: readonly ListedNote[] }) {
  const counts = levels
    .map((level) => ({ level, count: notes.filter(({ note }) => note.level === level).length }))
    .filter(({ count }) => count > 0);
  const sorted = levels.flatMap((level) => notes.filter(({ note }) => note.level === level));
  const summary = counts.map(({ level, count }) => formatCount(count, level)).join(", ");

  return (
    <section className="notes-list" aria-label="Faults, cautions and remarks">
      <h2 role="status">{summary === "" ? "" : summary[0]!.toUpperCase() + summary.slice(1)}</h2>
      <ul>
        {sorted.map(({ note, letter, cell }, index) => (
          <li key={`${cell.id} ${note.code} ${index}`}>
            <StateMark state={note.level} label={note.level} />
            <i className="table-letter" data-level={note.level}>
              {letter}
            </i>
            <a href={`#cell-${cell.id}`}>
              <b>{cell.name || cell.kind}</b>: <Rich text={formatMessage(complaintOf(note))} />
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** The margin has room for what is wrong; why, and what to do, stands in the cell. */
const complaintOf = (note: Note): string => complaintAndRest(note.message)[0].replace(/;$/, ".");
