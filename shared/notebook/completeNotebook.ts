import type { NotebookDocument } from "./document";
import { evaluateNotebook } from "./evaluateNotebook";
import { finishTask } from "./finishTask";
import { nothingSupplied, type SuppliedReferences } from "./references";
import type { Evaluation } from "./result";
import { taskRunner } from "./runTask";
import type { LongTask, TaskAnswer, TaskPart } from "./tasks";

/** Points computed between two looks at the time. */
const pointsAtOnce = 16;

/**
 * Answers a notebook with its sweeps and spreads, one point after the other.
 *
 * @param mayGoOn  asked every few points; where it says no, what is done so far is answered, and marked as partial
 */
export function completeNotebook(
  document: NotebookDocument,
  mayGoOn: () => boolean = () => true,
  references: SuppliedReferences = nothingSupplied,
): Evaluation {
  const answers = new Map<string, TaskAnswer>();
  const { evaluation, memory, tasks } = evaluateNotebook(document, undefined, undefined, references);
  if (tasks.length === 0) return evaluation;
  for (const task of tasks) answers.set(task.key, completeTask(document, task, mayGoOn, references));
  return evaluateNotebook(document, memory, answers, references).evaluation;
}

function completeTask(
  document: NotebookDocument,
  task: LongTask,
  mayGoOn: () => boolean,
  references: SuppliedReferences,
): TaskAnswer {
  const run = taskRunner(document, task, references);
  const parts: TaskPart[] = [];
  for (let from = 0; from < task.points && mayGoOn(); from += pointsAtOnce)
    parts.push(run(from, Math.min(task.points, from + pointsAtOnce)));
  return finishTask(document, task, parts, references);
}
