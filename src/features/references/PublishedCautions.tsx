import { answeredCautions } from "../../../shared/notebook/cautionAnswers";
import type { ReferenceResponse } from "../../../shared/schemas/references";
import { formatMessage } from "../../lib/formatMessage";
import { Rich } from "../../lib/Rich";
import { StateMark } from "../../ui/StateMark";

/** Cautions that stand in the edition, each with the answer that the lead accepted. */
export function PublishedCautions({ reference: { document, result } }: { reference: ReferenceResponse }) {
  const cautions = answeredCautions(document, result.cells);
  if (cautions.length === 0) return null;
  return (
    <ul className="m-0 list-none p-0 pt-10 type-label" aria-label="Cautions and their answers">
      {cautions.map(({ key, cell, note, answer }) => (
        <li key={key} className="py-4">
          <StateMark state="caution" label="caution" /> <b>{cell}</b>: <Rich text={formatMessage(note.message)} />
          {answer && ` Answered: “${answer.sentence}”`}
        </li>
      ))}
    </ul>
  );
}
