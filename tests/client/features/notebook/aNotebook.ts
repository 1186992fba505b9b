import type { Cell, NotebookDocument } from "../../../../shared/notebook/document";
import type { DraftState } from "../../../../shared/schemas/notebooks";

/** A small notebook about Ilmara, for tests of the page. */
export function aNotebook(change: Partial<NotebookDocument> = {}): NotebookDocument {
  return {
    format: 1,
    title: "Escape from Ilmara",
    unitSystem: "SI",
    headline: [],
    authors: ["Tamsin Orevale"],
    cells: [
      aCell({ id: "text", kind: "prose", name: "intro", text: "Ilmara is small, warm and dry." }),
      aCell({ id: "body", kind: "body", name: "ilmara", text: "mass = 0.41 earth_mass\nradius = 4943 km" }),
      aCell({
        id: "air",
        kind: "column",
        name: "dayside",
        text: "body = ilmara\nbase = 80 km\npressure = 0.42 Pa\ngases = CO2: rest, N2: 3 %\ntemperature = 300 K",
      }),
    ],
    ...change,
  };
}

export function aCell(change: Partial<Cell> = {}): Cell {
  return { id: "cell", kind: "values", name: "given", text: "T_quiet = 420 K", ...change };
}

/** The document with some cells' texts replaced, by cell id. */
export function withTexts(document: NotebookDocument, texts: Record<string, string>): NotebookDocument {
  return {
    ...document,
    cells: document.cells.map((cell) => (cell.id in texts ? { ...cell, text: texts[cell.id]! } : cell)),
  };
}

export function aServerDraft(change: Partial<DraftState> = {}): DraftState {
  return {
    revision: 7,
    document: aNotebook(),
    savedAt: "2031-04-02T10:42:00.000Z",
    savedBy: { id: "tamsin", name: "Tamsin Orevale" },
    ...change,
  };
}

export const wiremu = { id: "wiremu", name: "Wiremu Castellane" };
