/** A notebook as explanations look at it: each cell with its entries and its answer. */
import type { Cell } from "../document";
import { parseEntries } from "../language/parseEntries";
import type { Entry } from "../language/syntax";
import type { CellEvaluation } from "../result";
import type { RelatedKind } from "./record";

export interface ExplainedCell {
  cell: Cell;
  evaluation: CellEvaluation;
  entries: readonly Entry[];
}

export interface ExplainedNotebook {
  cells: readonly ExplainedCell[];
}

const read = new WeakMap<Cell, readonly Entry[]>();

/** @param evaluations in any order; a cell that has none is left out */
export function explainedNotebook(
  cells: readonly Cell[],
  evaluations: Iterable<CellEvaluation>,
): ExplainedNotebook {
  const byId = new Map([...evaluations].map((evaluation) => [evaluation.id, evaluation]));
  return {
    cells: cells.flatMap((cell) => {
      const evaluation = byId.get(cell.id);
      return evaluation && cell.kind !== "prose" ? [{ cell, evaluation, entries: entriesOf(cell) }] : [];
    }),
  };
}

function entriesOf(cell: Cell): readonly Entry[] {
  const known = read.get(cell);
  if (known) return known;
  const { entries } = parseEntries(cell.text);
  read.set(cell, entries);
  return entries;
}

export function entryOf({ entries }: ExplainedCell, key: string): Entry | undefined {
  return entries.find((entry) => entry.key === key);
}

/** Value of an entry as it is written, on one line. */
export function entryText({ cell }: ExplainedCell, { valueRange }: Entry): string {
  return cell.text.slice(valueRange.from, valueRange.to).replace(/\s+/g, " ");
}

/** The cell of that kind that a cell rests on: itself, or one named by its entries or by theirs. */
export function relatedCell(
  notebook: ExplainedNotebook,
  cell: ExplainedCell,
  kind: RelatedKind,
): ExplainedCell | null {
  if (cell.cell.kind === kind) return cell;
  for (const key of ["escape", "column", "body"] as const) {
    const node = entryOf(cell, key)?.node;
    if (node?.type !== "name") continue;
    const named = cellNamed(notebook, node.path);
    if (named?.cell.kind === key) return relatedCell(notebook, named, kind);
  }
  return null;
}

export function cellNamed(notebook: ExplainedNotebook, name: string): ExplainedCell | null {
  return notebook.cells.find(({ cell }) => cell.name === name) ?? null;
}

/** Where the name of a result or of a `values` entry leads; null where there is none. */
export function placeNamed(
  notebook: ExplainedNotebook,
  path: string,
): { cell: ExplainedCell; name: string } | null {
  const values = notebook.cells.find(
    ({ cell, evaluation }) => cell.kind === "values" && Object.hasOwn(evaluation.result.values, path),
  );
  if (values) return { cell: values, name: path };
  const cut = path.indexOf(".");
  const cell = cut < 0 ? null : cellNamed(notebook, path.slice(0, cut));
  const name = path.slice(cut + 1);
  return cell && Object.hasOwn(cell.evaluation.result.values, name) ? { cell, name } : null;
}
