import type { NotebookDocument } from "./document";
import { openTask, type EvaluatedPoint, type OpenTask } from "./evaluation/openTask";
import { spreadDraws } from "./evaluation/spreadDraws";
import { sweepPoint } from "./evaluation/sweepPoints";
import type { Replacements } from "./evaluation/surroundings";
import type { TaskPlan } from "./evaluation/taskPlan";
import { nothingSupplied, type SuppliedReferences } from "./references";
import type { LongTask, PointOutcome, TaskPart } from "./tasks";

/**
 * Computes points `from` up to, but not including, `to` of a task. A pure function: each point rests on its index alone,
 * so any split over any number of workers gives the same bits.
 */
export function runTask(
  document: NotebookDocument,
  task: LongTask,
  from: number,
  to: number,
  references: SuppliedReferences = nothingSupplied,
): TaskPart {
  return taskRunner(document, task, references)(from, to);
}

/** The same for many parts: what all points share is done once. Throws where the document has no such task. */
export function taskRunner(
  document: NotebookDocument,
  task: LongTask,
  references: SuppliedReferences = nothingSupplied,
): (from: number, to: number) => TaskPart {
  const open = openTask(document, task, references);
  const replacementsAt = replacementsOf(open.plan);
  return (from, to) => runPart(open, replacementsAt, from, to);
}

type ReplacementsAt = (index: number) => (cellId: string) => Replacements;

function replacementsOf(plan: TaskPlan): ReplacementsAt {
  if (plan.kind === "spread") {
    const draws = spreadDraws(plan);
    return (index) => draws.replacements(draws.coordinatesAt(index));
  }
  const { axes } = plan;
  return (index) => {
    const values = sweepPoint(axes, index);
    const replaced = new Map(axes.map(({ name }, axis) => [name, values[axis]]));
    return () => ({ replaced: (key) => replaced.get(key) });
  };
}

function runPart({ plan, evaluate }: OpenTask, at: ReplacementsAt, from: number, to: number): TaskPart {
  const values = plan.watch.map(() => new Float64Array(to - from));
  const outcomes = new Map<string, PointOutcome>();
  for (let index = from; index < to; index += 1) {
    const point = evaluate(at(index));
    point.values.forEach((value, watched) => (values[watched][index - from] = value));
    for (const outcome of outcomesOf(point, plan.watch)) {
      const key = `${outcome.level} ${outcome.cell} ${outcome.code}`;
      const known = outcomes.get(key);
      if (!known) outcomes.set(key, { ...outcome, points: [index] });
      else if (known.points[known.points.length - 1] !== index) known.points.push(index);
    }
  }
  return { key: plan.key, from, to, values, outcomes: [...outcomes.values()] };
}

/** Every caution; and where a watched name has no answer, the first fault, or that it does not exist here. */
function outcomesOf(
  { values, said }: EvaluatedPoint,
  watch: readonly string[],
): Omit<PointOutcome, "points">[] {
  const outcomes: Omit<PointOutcome, "points">[] = [];
  for (const { cell, note } of said) {
    const { level, code, message } = note;
    if (level === "caution") outcomes.push({ level, code, cell, message });
  }
  const missing = values.findIndex(Number.isNaN);
  if (missing < 0) return outcomes;
  const fault = said.find(({ note }) => note.level === "fault");
  if (fault) {
    const { code, message } = fault.note;
    outcomes.push({ level: "fault", code, cell: fault.cell, message });
  } else {
    const name = watch[missing];
    const message = `*${name}* does not exist here.`;
    outcomes.push({ level: "fault", code: "does_not_exist", cell: name.split(".", 1)[0], message });
  }
  return outcomes;
}
