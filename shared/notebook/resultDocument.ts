import type { Evaluation, ResultDocument } from "./result";

/** What a notebook answers, without what only the page needs. */
export function resultDocument(evaluation: Evaluation): ResultDocument {
  return {
    engine: evaluation.engine,
    title: evaluation.title,
    cells: evaluation.cells.map(({ result }) => result),
  };
}
