/** Published references as the evaluation takes them: pinned to an edition, and never computed anew. */
import type { BodyModel } from "./evaluation/models";
import { parseEntries } from "./language/parseEntries";
import { pinsIn } from "./language/readPin";
import type { NotebookDocument } from "./document";
import type { ResultValue } from "./result";

/** One edition, as it was published. */
export interface SuppliedReference {
  /** As it is written in a cell: "CAR4.2". */
  pin: string;
  /** Results by the name that the reference's notebook gave them: "leak.H.rate", "T_quiet". SI. */
  values: Readonly<Record<string, Pick<ResultValue, "value" | "unit">>>;
  /** What its body cells hand on, by name. Bare numbers are SI. */
  bodies: Readonly<Record<string, BodyModel>>;
  /** The newest edition of the same reference. */
  newest: number;
  /** Why it was withdrawn; null while it stands. */
  withdrawn: string | null;
}

/** By pin. */
export type SuppliedReferences = ReadonlyMap<string, SuppliedReference>;

export const nothingSupplied: SuppliedReferences = new Map();

/** Every edition that a notebook pins, in the order of its text: "CAR4.2". */
export function pinsOf({ cells }: Pick<NotebookDocument, "cells">): string[] {
  const pins = cells.flatMap(({ kind, text }) =>
    kind === "prose" || !text.includes("ref")
      ? []
      : parseEntries(text).entries.flatMap(({ node }) => pinsIn(node).map(({ pin }) => pin)),
  );
  return [...new Set(pins)];
}
