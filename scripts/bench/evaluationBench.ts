import { readFileSync } from "node:fs";
import type { NotebookDocument } from "../../shared/notebook/document";
import { evaluateNotebook } from "../../shared/notebook/evaluateNotebook";
import { readNotebookFile } from "../../shared/notebook/notebookFile";
import type { BenchTable, Timer } from "./timing";

const file = "server/demo/notebooks/ilmara-dayside.md";

/** A whole notebook with a column of eight gases: from nothing, and after one more character is written. */
export function evaluationBench(time: Timer): BenchTable {
  const document = readDocument();
  const { memory } = evaluateNotebook(document);
  const turns: [string, () => void][] = [
    ["from nothing", () => evaluateNotebook(document)],
    ["nothing changed", () => evaluateNotebook(document, memory)],
    ["a remark of a value", afterWriting(document, "given", "two occultations", "three occultations")],
    ["a value that the column uses", afterWriting(document, "given", "T_quiet = 428", "T_quiet = 429")],
    ["levels of the column", afterWriting(document, "dayside", "80 km, 100 km", "80 km, 101 km")],
    ["gases of the escape cell", afterWriting(document, "leak", "H, H2, He", "H2, H, He")],
  ];
  const rows = turns.map(([what, turn]) => {
    const { median, ratio } = time(turn);
    return [what, median.toFixed(2), ratio.toFixed(1)];
  });
  return {
    title: "Notebook",
    remark: "Warm medians of one evaluation, profiles and strip included.",
    columns: ["changed", "ms", "÷ plain loop"],
    rows,
  };
}

function readDocument(): NotebookDocument {
  let count = 0;
  const reading = readNotebookFile(readFileSync(file, "utf8"), () => String((count += 1)));
  if (!reading.ok) throw new Error(`${file} is no notebook`);
  return reading.document;
}

/** Evaluates with what is remembered of the other text, to and fro, so that every turn has something to do. */
function afterWriting(document: NotebookDocument, name: string, from: string, to: string): () => void {
  const cells = document.cells.map((cell) =>
    cell.name === name ? { ...cell, text: cell.text.replace(from, to) } : cell,
  );
  const changed = { ...document, cells };
  let { memory } = evaluateNotebook(document);
  let isChanged = false;
  return () => {
    isChanged = !isChanged;
    memory = evaluateNotebook(isChanged ? changed : document, memory).memory;
  };
}
