import type { Cell, NotebookDocument } from "../../shared/notebook/document";

/** A small sound notebook of the invented moon Nirel; what is given takes the place of its parts. */
export function buildDocument(parts: Partial<NotebookDocument> = {}): NotebookDocument {
  return {
    format: 1,
    title: "Nirel, a first look",
    unitSystem: "SI",
    headline: [],
    authors: ["Tamsin Orevale"],
    cells: [
      buildCell({ id: "intro", kind: "prose", name: "intro", text: "How cold is it up there?" }),
      buildCell({ id: "warmth", kind: "values", name: "warmth", text: "T_quiet = 240 K # assumed" }),
    ],
    ...parts,
  };
}

export function buildCell(parts: Partial<Cell> & { id: string }): Cell {
  return { kind: "values", name: parts.id, text: "", ...parts };
}
