import type { CellEvaluation, DrawnColumn } from "../../../../shared/notebook/result";
import { columnOf } from "./columnCoronae";

export interface ShownColumn extends DrawnColumn {
  /** Name of the escape cell whose flux it feels; null for the gas at rest. */
  escape: string | null;
}

const shown = new WeakMap<DrawnColumn, ShownColumn>();

/**
 * A column as figure and strip show it: as what escapes leaves it, by the first escape cell that is solved with its
 * flux; where there is none, at rest. The same object for the same evaluations; null where there is no answer.
 */
export function drawnColumn(
  evaluation: CellEvaluation | undefined,
  cells: ReadonlyMap<string, CellEvaluation>,
): ShownColumn | null {
  if (!evaluation?.strip || !evaluation.result.profiles) return null;
  const { name, profiles } = evaluation.result;
  for (const other of cells.values()) {
    const { column } = other;
    if (column && columnOf(other, cells) === name)
      return remembered(column, { ...column, escape: other.result.name });
  }
  return atRest(evaluation, { profiles, strip: evaluation.strip, escape: null });
}

function remembered(column: DrawnColumn, fresh: ShownColumn): ShownColumn {
  const last = shown.get(column);
  if (last?.escape === fresh.escape) return last;
  shown.set(column, fresh);
  return fresh;
}

const resting = new WeakMap<CellEvaluation, ShownColumn>();

function atRest(evaluation: CellEvaluation, fresh: ShownColumn): ShownColumn {
  const last = resting.get(evaluation);
  if (last) return last;
  resting.set(evaluation, fresh);
  return fresh;
}
