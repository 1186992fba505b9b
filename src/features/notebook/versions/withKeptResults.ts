import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { KeptResult } from "../../../../shared/schemas/results";
import type { LiveEvaluation } from "../evaluation/useEvaluation";

/**
 * An evaluation whose values, tables and notes are those kept with a version. Curves are not kept: they are drawn
 * from the text, as it is understood now.
 */
export function withKeptResults(
  live: LiveEvaluation,
  document: NotebookDocument,
  kept: KeptResult,
): LiveEvaluation {
  if (!live.evaluated) return live;
  const cells = new Map(live.evaluated.cells);
  document.cells.forEach(({ id }, index) => {
    const evaluation = cells.get(id);
    const result = kept.cells[index];
    if (evaluation && result) cells.set(id, { ...evaluation, result: { ...evaluation.result, ...result } });
  });
  return { ...live, evaluated: { ...live.evaluated, cells } };
}
