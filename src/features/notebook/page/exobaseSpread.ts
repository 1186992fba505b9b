import type { CellEvaluation, ResultSpread } from "../../../../shared/notebook/result";
import type { NumberSpread } from "../../../lib/formatSpread";
import { columnOf } from "../cells/columnCoronae";

/**
 * How far the exobase that a strip marks may lie from there, where a spread watches it: that of an escape cell on the
 * column by the same criterion, the whole gas. Its flux may move it a little; within its own spread that is said of both.
 *
 * @param exobase  altitude marked, m
 * @returns        altitudes, m
 */
export function exobaseSpread(
  column: string,
  exobase: number,
  cells: ReadonlyMap<string, CellEvaluation>,
): NumberSpread | null {
  for (const evaluation of cells.values()) {
    const { result, convention } = evaluation;
    if (result.kind !== "escape" || convention?.criterion.startsWith("bulk") !== true) continue;
    const altitude = result.values["exobase.altitude"];
    if (!altitude?.spread || columnOf(evaluation, cells) !== column) continue;
    const offset = Number(altitude.value) - exobase;
    const ends = around(altitude.spread, offset);
    if (ends && ends.lower <= exobase && exobase <= ends.upper) return ends;
  }
  return null;
}

function around({ lower, upper }: ResultSpread, offset: number): NumberSpread | null {
  return lower === null || upper === null ? null : { lower: lower - offset, upper: upper - offset };
}
