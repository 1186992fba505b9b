import { columnProblem, type ColumnProblem } from "../column/columnProblem";
import { boltzmann } from "../constants/codata2022";
import { PhysicsDomainError } from "../errors";
import { exobaseNumber, type ExobaseNumber } from "../exobase/exobaseNumber";
import { requirePositive } from "../guards";
import { logarithm } from "../numerics/elementary";
import type { CoupledInput } from "../types";

/** A column made ready for the solver, with how its gases escape. */
export interface EscapingColumn {
  readonly problem: ColumnProblem;
  /** The number that is 1 at the exobase, by the criterion asked for and by the bulk one. */
  readonly number: ExobaseNumber;
  readonly bulk: ExobaseNumber;
  /** ln(c √(k/2πm)) of each present gas, c its correction, for velocities in m s⁻¹ and T in K. */
  readonly logSpeeds: Float64Array;
}

/**
 * Checks a column and how it escapes, and makes both ready.
 *
 * @throws  PhysicsDomainError if an input is impossible
 */
export function escapingColumn(input: CoupledInput): EscapingColumn {
  const problem = columnProblem(input);
  const formulas = input.gases.map(({ formula }) => formula);
  for (const [formula, factor] of Object.entries(input.corrections)) {
    requirePositive(`correction of ${formula}`, factor);
    if (formulas.includes(formula)) continue;
    const requirement = `one of a gas of the column: ${formulas.join(", ")}`;
    throw new PhysicsDomainError(`correction of ${formula}`, factor, requirement);
  }
  const bulk = exobaseNumber(problem, { kind: "bulk" });
  return {
    problem,
    bulk,
    number: input.criterion.kind === "bulk" ? bulk : exobaseNumber(problem, input.criterion),
    logSpeeds: Float64Array.from(problem.present, (gas) => {
      const { formula, mass } = input.gases[gas];
      return (
        logarithm(input.corrections[formula] ?? 1) + logarithm(boltzmann.value / (2 * Math.PI * mass)) / 2
      );
    }),
  };
}
