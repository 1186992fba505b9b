import { readFileSync } from "node:fs";
import path from "node:path";

import type { NotebookDocument } from "../../../shared/notebook/document";
import { readNotebookFile } from "../../../shared/notebook/notebookFile";

/** A notebook of `tests/fixtures/notebooks`. */
export function fixtureNotebook(name: string): NotebookDocument {
  const file = path.join(import.meta.dirname, "../../fixtures/notebooks", name);
  let count = 0;
  const reading = readNotebookFile(readFileSync(file, "utf8"), () => String((count += 1)));
  if (!reading.ok) throw new Error(reading.notes.map(({ message }) => message).join("\n"));
  return reading.document;
}
