import { cellSchemas } from "./cellSchemas";
import type { Cell, NotebookDocument } from "./document";
import { engineVersion } from "./engine";
import { evaluateCell, type EvaluatedCell } from "./evaluation/evaluateCell";
import {
  addCell,
  answersTheSame,
  nothingAbove,
  recordQuestions,
  surroundingsOf,
  usedNames,
  type NamePlaces,
  type RecordedSurroundings,
} from "./evaluation/surroundings";
import { parseEntries } from "./language/parseEntries";
import type { ParsedEntries } from "./language/syntax";
import { withSpreads, type DecoratedCell } from "./evaluation/withSpreads";
import { nothingSupplied, type SuppliedReferences } from "./references";
import type { CellEvaluation, Evaluation } from "./result";
import type { LongTask, PartialTask, TaskAnswer, TaskAnswers } from "./tasks";

interface RememberedCell {
  cell: Cell;
  parsed: ParsedEntries;
  unitSystem: NotebookDocument["unitSystem"];
  questions: RecordedSurroundings["questions"];
  evaluated: EvaluatedCell;
  evaluation: CellEvaluation;
  /** The evaluation with the spreads of its results, where it has any. */
  decorated?: DecoratedCell;
}

/** What one evaluation leaves for the next: by cell id, the answer and all that it rested on. */
export type EvaluationMemory = ReadonlyMap<string, RememberedCell>;

/**
 * Answers a notebook, from top to bottom. A pure function of the document: `previous` makes it faster, never
 * different. A cell whose text and whose view of the cells above have not changed keeps its answer, the same object.
 *
 * Sweeps and spreads take long: they are answered from `answers` or the memory where their task has been done, else
 * listed in `tasks`. Those that were stopped before their end are answered in part, and listed in `partial`.
 *
 * What `ref(…)` names is taken from `references`; a pin that is not among them is a fault of its cell.
 *
 * Never throws: whatever cannot be answered is said in the notes of a cell.
 */
export function evaluateNotebook(
  document: NotebookDocument,
  previous?: EvaluationMemory,
  answers?: TaskAnswers,
  references: SuppliedReferences = nothingSupplied,
): { evaluation: Evaluation; memory: EvaluationMemory; tasks: LongTask[]; partial: PartialTask[] } {
  const taskAnswer = knownAnswers(previous, answers);
  const memory = new Map<string, RememberedCell>();
  const parsed = document.cells.map((cell) => parse(cell, previous?.get(cell.id)));
  const places = namePlaces(document, parsed);
  let above = nothingAbove;

  const remembered = document.cells.map((cell, place) => {
    const surroundings = surroundingsOf(above, places, place, taskAnswer, references);
    const last = previous?.get(cell.id);
    const answered =
      last && isSameCell(last, cell, document) && answersTheSame(last.questions, surroundings)
        ? last
        : answer(cell, parsed[place], recordQuestions(surroundings), document, last?.evaluated);
    above = addCell(above, answered.evaluated.above);
    return answered;
  });
  const cells = withSpreads(remembered);
  remembered.forEach((answered, place) => {
    memory.set(answered.cell.id, { ...answered, decorated: cells[place] });
  });
  const tasks: LongTask[] = [];
  const partial: PartialTask[] = [];
  for (const { cell, evaluated } of remembered) {
    const task = taskOf(cell, evaluated);
    const done = evaluated.taskAnswer?.done;
    if (task && done === undefined) tasks.push(task);
    else if (task && done! < task.points) partial.push({ task, done: done! });
  }
  const evaluation = { engine: engineVersion, title: document.title, cells: cells.map((one) => one.shown) };
  return { evaluation, memory, tasks, partial };
}

/** What a cell asks for, answered or not. */
function taskOf({ id, name }: Cell, { plan }: EvaluatedCell): LongTask | null {
  if (!plan) return null;
  return { cellId: id, kind: plan.kind, name, key: plan.key, points: plan.points };
}

function knownAnswers(previous: EvaluationMemory | undefined, answers: TaskAnswers | undefined) {
  const remembered = new Map<string, TaskAnswer>();
  for (const { evaluated } of previous?.values() ?? [])
    if (evaluated.taskAnswer) remembered.set(evaluated.taskAnswer.key, evaluated.taskAnswer);
  return (key: string): TaskAnswer | undefined => answers?.get(key) ?? remembered.get(key);
}

const noEntries: ParsedEntries = { entries: [], notes: [] };

function parse({ kind, text }: Cell, last: RememberedCell | undefined): ParsedEntries {
  if (kind === "prose") return noEntries;
  return last && last.cell.kind !== "prose" && last.cell.text === text ? last.parsed : parseEntries(text);
}

function answer(
  cell: Cell,
  parsed: ParsedEntries,
  surroundings: RecordedSurroundings,
  { unitSystem }: NotebookDocument,
  last: EvaluatedCell | undefined,
): RememberedCell {
  const evaluated = evaluateCell(cell, parsed, surroundings, unitSystem, last);
  const { result, understood, defaults, gases, strip, convention, column, corona, ion, lightHistory } =
    evaluated;
  const uses = usedNames(surroundings.questions);
  const evaluation = {
    id: cell.id,
    result,
    understood,
    defaults,
    uses,
    gases,
    ...(strip ? { strip } : {}),
    ...(convention ? { convention } : {}),
    ...(column ? { column } : {}),
    ...(corona ? { corona } : {}),
    ...(ion === undefined ? {} : { ion }),
    ...(lightHistory ? { lightHistory } : {}),
  };
  return { cell, parsed, unitSystem, questions: surroundings.questions, evaluated, evaluation };
}

function isSameCell(last: RememberedCell, cell: Cell, { unitSystem }: NotebookDocument): boolean {
  const { kind, name, text } = last.cell;
  return kind === cell.kind && name === cell.name && text === cell.text && last.unitSystem === unitSystem;
}

/** Where each name is first defined: cells, and entries of `values` cells. */
function namePlaces({ cells }: NotebookDocument, parsed: readonly ParsedEntries[]): NamePlaces {
  const places = new Map<string, number>();
  const define = (name: string, place: number) => {
    if (name !== "" && !places.has(name)) places.set(name, place);
  };
  cells.forEach((cell, place) => {
    if (cell.kind !== "prose") define(cell.name, place);
    if (!cellSchemas[cell.kind].takesAnyKey) return;
    for (const { key } of parsed[place].entries) define(key, place);
  });
  return places;
}
