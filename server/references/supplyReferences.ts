import { pinsOf, type SuppliedReference } from "../../shared/notebook/references";
import type { NotebookDocument } from "../../shared/notebook/document";
import type { Db } from "../db/client";
import { findPinned } from "../db/reads/findReference";
import { referencePolicy } from "../policies/referencePolicy";
import { presentSupplied } from "../presenters/presentReference";

/** The references that a document pins, as far as this person may use them. */
export async function supplyReferences(
  db: Db,
  document: NotebookDocument,
  personId: string,
): Promise<SuppliedReference[]> {
  return supplyPins(db, pinsOf(document), personId);
}

/** The same for pins; null is somebody signed out. */
export async function supplyPins(
  db: Db,
  pins: readonly string[],
  personId: string | null,
): Promise<SuppliedReference[]> {
  const actor = personId === null ? null : { id: personId, name: "", email: "" };
  const rows = await findPinned(db, pins, personId);
  return rows.filter((row) => referencePolicy.use(actor, row)).map(presentSupplied);
}
