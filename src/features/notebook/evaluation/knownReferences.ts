import type { NotebookDocument } from "../../../../shared/notebook/document";
import { pinsOf, type SuppliedReference } from "../../../../shared/notebook/references";

/** Published references that the page has been given, by pin. What was published never changes. */
const known = new Map<string, SuppliedReference>();

export function rememberReferences(references: readonly SuppliedReference[]): void {
  for (const reference of references) known.set(reference.pin, reference);
}

/** Those that a document pins, as far as the page has them. */
export function knownReferences(document: NotebookDocument): SuppliedReference[] {
  return pinsOf(document).flatMap((pin) => known.get(pin) ?? []);
}
