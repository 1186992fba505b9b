import type { CautionAnswer, Cell, NotebookDocument } from "./document";

/** A change to a document, as a value. Ids are made by whoever asks for the change. */
export type DocumentEdit =
  | { type: "insertCell"; index: number; cell: Cell }
  | { type: "removeCell"; id: string }
  | { type: "moveCell"; id: string; index: number }
  | { type: "changeText"; id: string; text: string }
  | { type: "renameCell"; id: string; name: string }
  | { type: "changeTitle"; title: string }
  | { type: "changeUnitSystem"; unitSystem: NotebookDocument["unitSystem"] }
  | { type: "changeHeadline"; headline: string[] }
  | { type: "changeAuthors"; authors: string[] }
  | { type: "changeAnswers"; answers: CautionAnswer[] }
  | { type: "several"; edits: DocumentEdit[] };

export interface EditedDocument {
  document: NotebookDocument;
  /** The edit that takes the new document back to the old one. */
  inverse: DocumentEdit;
}

/**
 * The document after an edit, and the edit that undoes it. The given document is left as it was; cells that the
 * edit does not touch stay the same objects.
 *
 * @throws RangeError if the edit names a cell that is not there, a place outside the document, or an id twice
 */
export function editDocument(document: NotebookDocument, edit: DocumentEdit): EditedDocument {
  switch (edit.type) {
    case "insertCell":
      return insertCell(document, edit.index, edit.cell);
    case "removeCell":
      return removeCell(document, edit.id);
    case "moveCell":
      return moveCell(document, edit.id, edit.index);
    case "changeText": {
      const { text } = cellOf(document, edit.id);
      return replaceCell(document, edit.id, { text: edit.text }, { ...edit, text });
    }
    case "renameCell": {
      const { name } = cellOf(document, edit.id);
      return replaceCell(document, edit.id, { name: edit.name }, { ...edit, name });
    }
    case "changeTitle":
      return { document: { ...document, title: edit.title }, inverse: { ...edit, title: document.title } };
    case "changeUnitSystem":
      return {
        document: { ...document, unitSystem: edit.unitSystem },
        inverse: { ...edit, unitSystem: document.unitSystem },
      };
    case "changeHeadline":
      return {
        document: { ...document, headline: [...edit.headline] },
        inverse: { ...edit, headline: document.headline },
      };
    case "changeAnswers": {
      const { answers = [], ...rest } = document;
      return {
        document: edit.answers.length === 0 ? rest : { ...rest, answers: [...edit.answers] },
        inverse: { ...edit, answers },
      };
    }
    case "changeAuthors":
      return {
        document: { ...document, authors: [...edit.authors] },
        inverse: { ...edit, authors: document.authors },
      };
    case "several":
      return editSeverally(document, edit.edits);
  }
}

function editSeverally(document: NotebookDocument, edits: DocumentEdit[]): EditedDocument {
  const inverses: DocumentEdit[] = [];
  let edited = document;
  for (const edit of edits) {
    const step = editDocument(edited, edit);
    edited = step.document;
    inverses.unshift(step.inverse);
  }
  return { document: edited, inverse: { type: "several", edits: inverses } };
}

function indexOf(document: NotebookDocument, id: string): number {
  const index = document.cells.findIndex((cell) => cell.id === id);
  if (index < 0)
    throw new RangeError(`No cell with id ${id} in a notebook of ${document.cells.length} cells`);
  return index;
}

function cellOf(document: NotebookDocument, id: string): Cell {
  return document.cells[indexOf(document, id)]!;
}

function requirePlace(index: number, last: number): void {
  if (!Number.isInteger(index) || index < 0 || index > last) {
    throw new RangeError(`Place ${index} is not between 0 and ${last}`);
  }
}

function insertCell(document: NotebookDocument, index: number, cell: Cell): EditedDocument {
  requirePlace(index, document.cells.length);
  if (document.cells.some(({ id }) => id === cell.id)) throw new RangeError(`Two cells with id ${cell.id}`);
  return {
    document: { ...document, cells: document.cells.toSpliced(index, 0, cell) },
    inverse: { type: "removeCell", id: cell.id },
  };
}

function removeCell(document: NotebookDocument, id: string): EditedDocument {
  const index = indexOf(document, id);
  return {
    document: { ...document, cells: document.cells.toSpliced(index, 1) },
    inverse: { type: "insertCell", index, cell: document.cells[index]! },
  };
}

/** `index` is the place in the new document. */
function moveCell(document: NotebookDocument, id: string, index: number): EditedDocument {
  const from = indexOf(document, id);
  requirePlace(index, document.cells.length - 1);
  const cells = document.cells.toSpliced(from, 1).toSpliced(index, 0, document.cells[from]!);
  return { document: { ...document, cells }, inverse: { type: "moveCell", id, index: from } };
}

function replaceCell(
  document: NotebookDocument,
  id: string,
  change: Partial<Pick<Cell, "text" | "name">>,
  inverse: DocumentEdit,
): EditedDocument {
  const index = indexOf(document, id);
  const cells = document.cells.with(index, { ...document.cells[index]!, ...change });
  return { document: { ...document, cells }, inverse };
}
