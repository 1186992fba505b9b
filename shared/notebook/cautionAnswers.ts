/** Sentences that answer cautions: which caution each is for, and whether it holds still. */
import type { CautionAnswer, NotebookDocument } from "./document";
import type { CellResult, Note } from "./result";

/** Relative change of a caution's number up to which its answer holds. */
const allowedMove = 0.01;

/** The numbers that a caution speaks of, in the order of its words; digits within names are none. */
export function numbersOf(message: string): number[] {
  const plain = message.replace(/(?<=\d)[\u00a0\u2009\u202f](?=\d)/g, "").replaceAll("−", "-");
  const found = plain.matchAll(/(?<![\w.*])-?\d+(?:\.\d+)?(?:(?:e|×10\^)-?\d+)?(?![\w*])/gi);
  return [...found].map(([text]) => Number(text.replace("×10^", "e")));
}

/** What an answer is kept under. */
export const answerKey = ({ cell, code, entry }: Pick<CautionAnswer, "cell" | "code" | "entry">): string =>
  `${cell}/${code}/${entry}`;

export interface AnsweredCaution {
  key: string;
  cell: string;
  note: Pick<Note, "code" | "entry" | "message">;
  /** null where nobody has answered it. */
  answer: CautionAnswer | null;
  /** Its numbers have moved by over 1 % since it was answered. */
  hasLapsed: boolean;
}

/** Every caution of a notebook's cells with its answer, in the order of the cells. */
export function answeredCautions(
  { answers = [] }: Pick<NotebookDocument, "answers">,
  cells: readonly Pick<CellResult, "name" | "notes">[],
): AnsweredCaution[] {
  const byKey = new Map(answers.map((answer) => [answerKey(answer), answer]));
  return cells.flatMap(({ name, notes }) =>
    notes
      .filter(({ level }) => level === "caution")
      .map(({ code, entry, message }) => {
        const key = answerKey({ cell: name, code, entry: entry ?? "" });
        const answer = byKey.get(key) ?? null;
        const hasLapsed = answer !== null && hasMoved(answer.numbers, numbersOf(message));
        return { key, cell: name, note: { code, ...(entry === undefined ? {} : { entry }), message }, answer, hasLapsed };
      }),
  );
}

function hasMoved(before: readonly number[], now: readonly number[]): boolean {
  return (
    before.length !== now.length ||
    before.some((number, index) => Math.abs(now[index] - number) > allowedMove * Math.abs(number))
  );
}

/** The document with a caution answered; an empty sentence takes the answer back. */
export function answerCaution(
  document: NotebookDocument,
  { cell, note }: Pick<AnsweredCaution, "cell" | "note">,
  sentence: string,
): NotebookDocument {
  const { answers = [], ...rest } = document;
  const { code, entry = "", message } = note;
  const key = answerKey({ cell, code, entry });
  const others = answers.filter((answer) => answerKey(answer) !== key);
  const text = sentence.replace(/\s+/g, " ").trim();
  const kept = text === "" ? others : [...others, { cell, code, entry, numbers: numbersOf(message), sentence: text }];
  return kept.length === 0 ? rest : { ...rest, answers: kept };
}
