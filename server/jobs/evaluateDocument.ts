import type { NotebookDocument } from "../../shared/notebook/document";
import { evaluateNotebook } from "../../shared/notebook/evaluateNotebook";
import { resultDocument } from "../../shared/notebook/resultDocument";
import { summariseNotebook } from "../../shared/notebook/summariseNotebook";
import type { EvaluationOutcome } from "./evaluator";

/** What the server keeps of a document's evaluation: values, tables and notes without profiles, and the summary. */
export function evaluateDocument(document: NotebookDocument): EvaluationOutcome {
  const { evaluation } = evaluateNotebook(document);
  const { engine, title, cells } = resultDocument(evaluation);
  const kept = cells.map(({ kind, name, status, values, tables, notes }) => ({
    kind,
    name,
    status,
    values,
    tables,
    notes,
  }));
  return { result: { engine, title, cells: kept }, summary: summariseNotebook(document, evaluation) };
}
