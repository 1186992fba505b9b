import type { JoinedParts } from "../finishTask";
import type { Uncertainty } from "../language/quantity";
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
    const { unit, value, uncertainty } = open.axes[axis];
    const sigma = uncertainty ? oneSigma(uncertainty) : {};
    return { name, part: "varied", unit, written: value, from: first, to: last, steps, spacing, ...sigma };
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

/**
 * One standard deviation below and above what is written, SI: of the number itself, or of its logarithm where it is given
 * within a factor. Of an even range, half of it over √3.
 */
function oneSigma(uncertainty: Uncertainty): { sigma_lower: number; sigma_upper: number } {
  switch (uncertainty.form) {
    case "normal": {
      const { mean, deviation } = uncertainty;
      return { sigma_lower: mean - deviation, sigma_upper: mean + deviation };
    }
    case "uniform": {
      const centre = (uncertainty.lower + uncertainty.upper) / 2;
      const deviation = (uncertainty.upper - uncertainty.lower) / 2 / Math.sqrt(3);
      return { sigma_lower: centre - deviation, sigma_upper: centre + deviation };
    }
    case "log_normal": {
      const { median, factor } = uncertainty;
      return { sigma_lower: median / factor, sigma_upper: median * factor };
    }
  }
}
