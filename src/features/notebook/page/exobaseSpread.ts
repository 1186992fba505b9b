import type { CellEvaluation } from "../../../../shared/notebook/result";
import { numberSpread, type NumberSpread } from "../../../lib/formatSpread";
import { columnOf } from "../cells/columnCoronae";

/** As a share of the spread. */
const little = 0.1;

/**
 * How far the exobase that a strip marks may lie from there, where a spread watches it: that of an escape cell on the
 * column by the same criterion, the whole gas. Its flux moves it; only where that is little beside the spread is the
 * spread that of the mark too.
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
    const ends = numberSpread(altitude.spread);
    const offset = Number(altitude.value) - exobase;
    if (!ends || Math.abs(offset) > little * (ends.upper - ends.lower)) continue;
    return { lower: ends.lower - offset, upper: ends.upper - offset };
  }
  return null;
}
