import { useState } from "react";
import { answerCaution, answeredCautions } from "../../../../shared/notebook/cautionAnswers";
import type { Cell, NotebookDocument } from "../../../../shared/notebook/document";
import type { Note, NoteLevel } from "../../../../shared/notebook/result";
import { formatCount } from "../../../lib/format";
import { formatMessage } from "../../../lib/formatMessage";
import { Rich } from "../../../lib/Rich";
import { useSettled } from "../../../lib/useSettled";
import { StateMark } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import { complaintAndRest } from "../cells/complaintAndRest";
import { AnswerLine } from "./AnswerLine";

export interface ListedNote extends LetteredNote {
  cell: Pick<Cell, "id" | "name" | "kind">;
}

const levels: readonly NoteLevel[] = ["fault", "caution", "remark"];

/** So many remarks are shown at once; more are folded under their number. */
const mostRemarks = 4;

/** In the margin: all that is wrong or doubtful in the notebook, faults first; each leads to its cell. */
export function NotesList({ notes, answers }: { notes: readonly ListedNote[]; answers?: CautionAnswers }) {
  const [isUnfolded, setUnfolded] = useState(false);
  const of = (level: NoteLevel) => notes.filter(({ note }) => note.level === level);
  const summary = levels
    .filter((level) => of(level).length > 0)
    .map((level) => formatCount(of(level).length, level))
    .join(", ");
  // Said aloud once writing has rested, not at each key.
  const spoken = useSettled(summary, 1_500);
  const remarks = of("remark");
  const isFolded = remarks.length > mostRemarks && !isUnfolded;

  return (
    <section className="notes-list" aria-label="Faults, cautions and remarks">
      {summary !== "" && <h2>{summary[0]!.toUpperCase() + summary.slice(1)}</h2>}
      <span className="visually-hidden" role="status">
        {spoken}
      </span>
      <ul>
        {[...of("fault"), ...of("caution"), ...(isFolded ? [] : remarks)].map((listed, index) => (
          <NoteLine key={`${listed.cell.id} ${listed.note.code} ${index}`} {...listed} answers={answers} />
        ))}
      </ul>
      {remarks.length > mostRemarks && (
        <TextButton
          className="ml-36"
          data-print="never"
          aria-expanded={isUnfolded}
          onClick={() => setUnfolded((before) => !before)}
        >
          {isFolded ? `show ${formatCount(remarks.length, "remark")}` : "fold the remarks"}
        </TextButton>
      )}
    </section>
  );
}

/** The draft's answers, and writing one. */
export interface CautionAnswers {
  document: NotebookDocument;
  /** null where it can only be read. */
  onChange: ((document: NotebookDocument) => void) | null;
}

function NoteLine({ note, letter, cell, answers }: ListedNote & { answers: CautionAnswers | undefined }) {
  const [caution] = answers ? answeredCautions(answers.document, [{ name: cell.name, notes: [note] }]) : [];
  return (
    <li>
      <StateMark state={note.level} label={note.level} />
      <i className="table-letter" data-level={note.level}>
        {letter}
      </i>
      <a href={`#cell-${cell.id}`}>
        <b>{cell.name || cell.kind}</b>: <Rich text={formatMessage(complaintOf(note))} />
      </a>
      {answers && caution && (answers.onChange || caution.answer) && (
        <AnswerLine
          caution={caution}
          onAnswer={
            answers.onChange &&
            ((sentence) => answers.onChange!(answerCaution(answers.document, caution, sentence)))
          }
        />
      )}
    </li>
  );
}

/** The margin has room for what is wrong; why, and what to do, stands in the cell. */
const complaintOf = (note: Note): string => complaintAndRest(note.message)[0].replace(/;$/, ".");
