/** References on the command line: a folder with one file an edition, as the page of the reference gives it. */
import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import type { NotebookDocument } from "../../shared/notebook/document";
import { nothingSupplied, pinsOf, type SuppliedReferences } from "../../shared/notebook/references";
import { suppliedReference } from "../../shared/schemas/references";

/** What a document pins, as far as the folder has it; or in words what is wrong with a file. */
export function readReferences(folder: string | null, document: NotebookDocument): SuppliedReferences | string {
  if (folder === null) return nothingSupplied;
  if (!existsSync(folder)) return `There is no folder ${folder}.`;
  const supplied = new Map();
  for (const pin of pinsOf(document)) {
    const file = path.join(folder, `${pin}.json`);
    if (!existsSync(file)) continue;
    const reading = suppliedReference.safeParse(parsed(readFileSync(file, "utf8")));
    if (!reading.success || reading.data.pin !== pin) return `${file} is not the file of reference ${pin}.`;
    supplied.set(pin, reading.data);
  }
  return supplied;
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
