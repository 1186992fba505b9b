import type { NotebookDocument } from "./document";
import { openTask } from "./evaluation/openTask";
import { spreadAnswer } from "./evaluation/spreadAnswer";
import { sweepAnswer } from "./evaluation/sweepAnswer";
import { nothingSupplied, type SuppliedReferences } from "./references";
import type { LongTask, PointOutcome, TaskAnswer, TaskPart } from "./tasks";

/** Points from the first without a gap, joined. */
export interface JoinedParts {
  done: number;
  /** By watched name. */
  values: Float64Array[];
  outcomes: PointOutcome[];
}

/**
 * The answer of a task from parts of it, in any order. Where parts are missing, from those without a gap before them, so
 * that a partial answer is that of the first so many points and can be had again; it is marked as partial.
 * Throws where the document has no such task.
 */
export function finishTask(
  document: NotebookDocument,
  task: LongTask,
  parts: readonly TaskPart[],
  references: SuppliedReferences = nothingSupplied,
): TaskAnswer {
  const open = openTask(document, task, references);
  const joined = joinParts(task, open.plan.watch.length, parts);
  const answer = open.plan.kind === "sweep" ? sweepAnswer(open, joined) : spreadAnswer(open, joined);
  const { done } = joined;
  if (done < task.points) {
    const what = open.plan.kind === "sweep" ? "points" : "draws";
    const message = `Stopped early: this is the answer of the first ${done} of ${task.points} ${what}.`;
    answer.notes.unshift({ level: "caution", code: "partial", message });
  }
  const watched = open.plan.watch.map((name, index) => ({ name, values: joined.values[index] }));
  return { key: task.key, points: task.points, done, ...answer, watched };
}

function joinParts(task: LongTask, watched: number, parts: readonly TaskPart[]): JoinedParts {
  const own = parts.filter(({ key }) => key === task.key).toSorted((a, b) => a.from - b.from);
  let done = 0;
  const taken: TaskPart[] = [];
  for (const part of own) {
    if (part.from !== done) continue;
    taken.push(part);
    done = part.to;
  }
  const values = Array.from({ length: watched }, (_, index) => {
    const all = new Float64Array(done);
    for (const part of taken) all.set(part.values[index], part.from);
    return all;
  });
  const outcomes = new Map<string, PointOutcome>();
  for (const outcome of taken.flatMap((part) => part.outcomes)) {
    const key = `${outcome.level} ${outcome.cell} ${outcome.code}`;
    const known = outcomes.get(key);
    if (!known) outcomes.set(key, { ...outcome, points: [...outcome.points] });
    else for (const point of outcome.points) known.points.push(point);
  }
  return { done, values, outcomes: [...outcomes.values()].toSorted(byLevelAndCount) };
}

/** Faults first, then by how many points they concern. */
function byLevelAndCount(one: PointOutcome, other: PointOutcome): number {
  const rank = ({ level }: PointOutcome) => (level === "fault" ? 0 : 1);
  return rank(one) - rank(other) || other.points.length - one.points.length;
}
