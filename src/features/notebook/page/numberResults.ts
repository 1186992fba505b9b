import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";

/** Numbers of a cell's first figure and first table. */
export interface ResultNumbers {
  figure: number;
  table: number;
}

/** A column has two figures, and a table where levels were asked for; an escape cell has one table. */
export function numberResults(
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): ReadonlyMap<string, ResultNumbers> {
  const numbers = new Map<string, ResultNumbers>();
  let figure = 1;
  let table = 1;
  for (const cell of document.cells) {
    numbers.set(cell.id, { figure, table });
    const tables = answers?.get(cell.id)?.result.tables;
    if (cell.kind === "column") figure += 2;
    if (cell.kind === "escape" || (tables?.levels?.length ?? 0) > 0) table += 1;
  }
  return numbers;
}
