import { PhysicsDomainError } from "../errors";
import { exobaseBy } from "../exobase/exobaseBy";
import { exobaseOutcome } from "../exobase/findExobase";
import type { Column, ColumnInput } from "../types";
import { columnNotes } from "./columnNotes";
import { altitudeOf, columnProblem } from "./columnProblem";
import { columnReaders } from "./columnReaders";
import { slopeEvaluations } from "./columnSlope";
import { findHomopauses } from "./findHomopauses";
import { marchUp, smallestEscapeParameter } from "./marchUp";

/** Error of ln p allowed in a step; what results is good to about a tenth of it. */
export const defaultTolerance = 1e-10;

/**
 * A column of gases in hydrostatic and diffusive balance with eddy mixing, without net flux, from its base up;
 * with the exobase and its fuzzy band, and the homopause of every gas.
 *
 *   d ln p/dz = −m̄g/kT
 *   dXᵢ/dz = −Xᵢ(mᵢ − m̄)g/kT − Xᵢ(αᵢ − ᾱ) d ln T/dz + Σⱼ (Xᵢφⱼ − Xⱼφᵢ)/bᵢⱼ,   φᵢ = K n dXᵢ/dz
 *
 * @param input      see `ColumnInput`; mole fractions add up to 1 within 1e-9, and that rest is shared out
 * @param tolerance  error of ln p allowed in a step, between 1e-13 and 1e-2
 * @returns          the column, good for as long as it is kept; what it has not is told in its outcomes
 *
 * @assumes  stationary, no chemistry, no flux; one temperature for all gases
 * @valid    up to the exobase; above it the profile is the hydrostatic continuation
 * @throws   PhysicsDomainError if an input breaks a bound, or if an altitude outside the column is asked for
 * @source   [ChapmanCowling1970], section 18.2; [BanksKockarts1973], chapter 15
 * @explained level_pressure, level_gas_mole_fraction
 */
export function solveColumn(input: ColumnInput, tolerance = defaultTolerance): Column {
  requireTolerance(tolerance);
  const before = slopeEvaluations();
  const problem = columnProblem(input);
  const march = marchUp(problem, tolerance);
  const { path } = march.along;
  const baseEscapeParameter = smallestEscapeParameter(path, 0);
  const exobase = exobaseOutcome({ ...march, baseEscapeParameter });
  const homopauses = findHomopauses(path, march.top);
  const topAltitude = input.top === "auto" || march.isCutShort ? altitudeOf(problem, march.top) : input.top;
  return {
    input,
    topAltitude,
    exobase,
    exobaseBy: (criterion) =>
      criterion.kind === "bulk" ? exobase : exobaseBy(march, criterion, baseEscapeParameter),
    homopauses: homopauses.map(({ outcome }) => outcome),
    ...columnReaders(path, topAltitude),
    notes: columnNotes(input, topAltitude, homopauses, march.isCutShort),
    evaluations: slopeEvaluations() - before,
  };
}

/** Refuses a tolerance that no march can keep to, or that means nothing. */
export function requireTolerance(tolerance: number): void {
  if (tolerance >= 1e-13 && tolerance <= 1e-2) return;
  throw new PhysicsDomainError("tolerance", tolerance, "between 1e-13 and 1e-2");
}
