import type { NotebookDocument } from "./document";

/**
 * What the content hash of a version covers, as one text: title, cells and engine. Equal content gives equal text
 * to the character; ids, authors, headline and unit system change no number and are left out.
 */
export function contentText(document: NotebookDocument, engine: string): string {
  return JSON.stringify({
    title: document.title,
    cells: document.cells.map(({ kind, name, text }) => ({ kind, name, text: text.replace(/\r\n?/g, "\n") })),
    engine,
  });
}
