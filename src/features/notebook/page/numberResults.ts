import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { countResults } from "../cells/answers/answers";

/** Numbers of a cell's first figure and first table. */
export interface ResultNumbers {
  figure: number;
  table: number;
}

/** Figures and tables are numbered down the notebook, each in a row of its own. */
export function numberResults(
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): ReadonlyMap<string, ResultNumbers> {
  const numbers = new Map<string, ResultNumbers>();
  let figure = 1;
  let table = 1;
  for (const cell of document.cells) {
    numbers.set(cell.id, { figure, table });
    const { values = {}, tables = {} } = answers?.get(cell.id)?.result ?? {};
    const own = countResults({ kind: cell.kind, values, tables });
    figure += own.figures;
    table += own.tables;
  }
  return numbers;
}
