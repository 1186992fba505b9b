import type { Note, TextRange } from "../result";
import { fault, type Remedy } from "./notes";

/** Ends the evaluation of one expression; caught where it began, so that callers see only notes. */
export class ExpressionFault extends Error {
  readonly notes: Note[];

  constructor(notes: Note[]) {
    super("an expression can't be evaluated");
    this.notes = notes;
  }
}

export function fail(code: string, range: TextRange, message: string, remedy?: Remedy): never {
  throw new ExpressionFault([fault(code, range, message, remedy)]);
}
