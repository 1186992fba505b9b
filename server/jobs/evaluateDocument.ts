import { performance } from "node:perf_hooks";
import type { NotebookDocument } from "../../shared/notebook/document";
import { completeNotebook } from "../../shared/notebook/completeNotebook";
import { evaluateNotebook } from "../../shared/notebook/evaluateNotebook";
import { publishedBodies } from "../../shared/notebook/publishedParts";
import { nothingSupplied, type SuppliedReferences } from "../../shared/notebook/references";
import type { Evaluation } from "../../shared/notebook/result";
import { resultDocument } from "../../shared/notebook/resultDocument";
import { summariseNotebook } from "../../shared/notebook/summariseNotebook";
import type { EvaluationOutcome } from "./evaluator";

/**
 * What the server keeps of a document's evaluation: values, tables and notes without profiles, and the summary.
 *
 * @param longWork  ms for sweeps and spreads, which are marked as partial where that is not enough; null leaves them out
 */
export function evaluateDocument(
  document: NotebookDocument,
  longWork: number | null = null,
  references: SuppliedReferences = nothingSupplied,
): EvaluationOutcome {
  const evaluation =
    longWork === null
      ? evaluateNotebook(document, undefined, undefined, references).evaluation
      : complete(document, longWork, references);
  const { engine, title, cells } = resultDocument(evaluation);
  const kept = cells.map(({ kind, name, status, values, tables, notes }) => ({
    kind,
    name,
    status,
    values,
    tables,
    notes,
  }));
  return {
    result: { engine, title, cells: kept },
    summary: summariseNotebook(document, evaluation),
    bodies: publishedBodies(document, references),
  };
}

function complete(document: NotebookDocument, longWork: number, references: SuppliedReferences): Evaluation {
  const end = performance.now() + longWork;
  return completeNotebook(document, () => performance.now() < end, references);
}
