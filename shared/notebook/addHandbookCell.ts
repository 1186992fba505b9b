import type { Cell, NotebookDocument } from "./document";
import { editDocument } from "./editDocument";
import type { HandbookCell } from "./handbookCells";

/** Where a cell is put: after all others, or over the first column, so that a gas acts in it. */
export type CellPlace = "end" | "aboveColumns";

export type AddedCell =
  | { ok: true; document: NotebookDocument; cell: Cell; index: number }
  /** What stands in the way and what to do. */
  | { ok: false; message: string };

/**
 * The document with a cell of the handbook put in. A name that is taken gets a number; a gas is named by its formula,
 * so of `choices` the first whose gas has no cell yet is taken.
 *
 * @param place  in words, or the index that the cell is to have
 */
export function addHandbookCell(
  document: NotebookDocument,
  choices: readonly HandbookCell[],
  id: string,
  place: CellPlace | number,
): AddedCell {
  const taken = takenNames(document);
  const chosen = choices.find(({ kind, name }) => kind !== "gas" || !taken.has(name));
  if (!chosen) {
    const formulas = choices.map(({ name }) => name).join(" and ");
    const cells = choices.length > 1 ? "cells" : "a cell";
    return {
      ok: false,
      message: `This notebook has ${cells} of the gas ${formulas} already, and a gas has one cell. Copy the entries and write them there.`,
    };
  }
  const cell: Cell =
    chosen.kind === "values"
      ? { ...chosen, id, name: freeName(chosen.name, taken), text: withFreeKeys(chosen.text, taken) }
      : { ...chosen, id, name: chosen.kind === "gas" ? chosen.name : freeName(chosen.name, taken) };
  const index = indexOf(document, place);
  return {
    ok: true,
    document: editDocument(document, { type: "insertCell", index, cell }).document,
    cell,
    index,
  };
}

function indexOf({ cells }: NotebookDocument, place: CellPlace | number): number {
  if (typeof place === "number") return place;
  const firstColumn = cells.findIndex(({ kind }) => kind === "column");
  return place === "aboveColumns" && firstColumn >= 0 ? firstColumn : cells.length;
}

/** Names of cells, and of the entries of values cells, which are known everywhere. */
function takenNames(document: NotebookDocument): Set<string> {
  const taken = new Set(document.cells.map(({ name }) => name));
  for (const { kind, text } of document.cells)
    if (kind === "values") for (const [, key] of text.matchAll(/^\s*([A-Za-z]\w*)\s*=/gm)) taken.add(key!);
  return taken;
}

function freeName(wanted: string, taken: ReadonlySet<string>): string {
  let name = wanted;
  for (let count = 2; taken.has(name); count += 1) name = `${wanted}_${count}`;
  return name;
}

const withFreeKeys = (text: string, taken: ReadonlySet<string>): string =>
  text.replace(/^[A-Za-z]\w*/gm, (key) => freeName(key, taken));
