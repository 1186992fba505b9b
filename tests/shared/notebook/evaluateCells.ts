import type { CellKind, NotebookDocument } from "../../../shared/notebook/document";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import type { CellEvaluation, CellResult } from "../../../shared/notebook/result";

export type WrittenCell = readonly [kind: CellKind, name: string, text: string];

/** A notebook of cells, whose ids are their places. */
export function notebookOf(
  cells: readonly WrittenCell[],
  parts: Partial<NotebookDocument> = {},
): NotebookDocument {
  return {
    format: 1,
    title: "A test",
    unitSystem: "SI",
    headline: [],
    authors: [],
    cells: cells.map(([kind, name, text], place) => ({ id: String(place), kind, name, text })),
    ...parts,
  };
}

export function evaluateCells(cells: readonly WrittenCell[]): CellEvaluation[] {
  return evaluateNotebook(notebookOf(cells)).evaluation.cells;
}

/** The result of the last cell. */
export function resultOf(...cells: readonly WrittenCell[]): CellResult {
  return evaluateCells(cells).at(-1)!.result;
}

/** A value that must be a number. */
export function numberIn({ values, notes }: CellResult, name: string): number {
  const value = values[name]?.value;
  if (typeof value !== "number") {
    throw new Error(`${name} is ${String(value)}: ${notes.map(({ message }) => message).join(" ")}`);
  }
  return value;
}
