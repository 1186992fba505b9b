import type { JoinedParts } from "../finishTask";
import type { ResultRow } from "../result";
import type { TaskAnswer } from "../tasks";
import type { OpenTask } from "./openTask";
import { numberOrNull } from "./resultValue";
import { sweepPoint } from "./sweepPoints";
import { outcomeNotes, outcomeRows, shownValue } from "./taskOutcomes";
import type { SweepPlan } from "./taskPlan";

/** Rows of the varied quantities and each watched name, what they are, and why points have no answer. */
export function sweepAnswer(
  open: OpenTask,
  joined: JoinedParts,
): Pick<TaskAnswer, "values" | "tables" | "notes" | "spreads" | "drawn"> {
  const { axes } = open.plan as SweepPlan;
  const reasons = new Map<number, string>();
  for (const { level, code, points } of joined.outcomes)
    if (level === "fault") for (const point of points) reasons.set(point, code);

  const rows = Array.from({ length: joined.done }, (_, index): ResultRow => {
    const row: ResultRow = {};
    sweepPoint(axes, index).forEach((value, axis) => (row[axes[axis].name] = numberOrNull(value)));
    open.plan.watch.forEach((name, watched) => (row[name] = shownValue(joined.values[watched][index])));
    if (reasons.size > 0) row.reason = reasons.get(index) ?? null;
    return row;
  });
  const varied = axes.map(({ name, first, last, steps, spacing }, axis): ResultRow => {
    const { unit, value } = open.axes[axis];
    return { name, part: "varied", unit, written: value, from: first, to: last, steps, spacing };
  });
  const watched = open.written.map(({ name, unit, value }): ResultRow => {
    return { name, part: "watched", unit, written: value, from: null, to: null, steps: null, spacing: null };
  });
  return {
    values: {},
    tables: { rows, quantities: [...varied, ...watched], ...outcomeRows(joined) },
    notes: outcomeNotes(joined, "points"),
    spreads: {},
    drawn: [],
  };
}
