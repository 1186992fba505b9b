import { boundParameter } from "../column/boundParameter";
import { altitudeOf } from "../column/columnProblem";
import { slopeEvaluations } from "../column/columnSlope";
import { setComposition } from "../column/composition";
import { defaultTolerance, requireTolerance, solveColumn } from "../column/solveColumn";
import { lawAt } from "../column/stepLaw";
import { logNumber } from "../exobase/exobaseNumber";
import { faultOfBase } from "../exobase/findExobase";
import { nameOfNumber } from "../exobase/nameOfNumber";
import { exponential } from "../numerics/elementary";
import type { CoupledInput, CoupledOutcome, ExobaseOutcome } from "../types";
import { coupledColumn, type UncountedColumn } from "./coupledColumn";
import { coupledNotes } from "./coupledNotes";
import { escapingColumn, type EscapingColumn } from "./escapingColumn";
import { escapingGases } from "./escapingGases";
import { findCoupledExobase, type CoupledExobase } from "./findCoupledExobase";
import { guessExobase, type ExobaseGuess } from "./guessExobase";
import { supplyShares } from "./supplyShares";
import { walkToExobase } from "./walkToExobase";

/** Where escape keeps no more than this share of any gas away from the exobase, the column is the one without flux. */
const negligibleDepletion = 1e-12;
/** Where no exobase is in sight but the number comes this near to 1, one is looked for all the same, for so many marches. */
const nearlyOne = 0.3;
const shortSearch = 30;

/**
 * A column whose gases flow up at the rates at which they escape from the exobase that these fluxes leave behind:
 * stationary, Fᵢ the same at every altitude below the exobase and nothing above.
 *
 *   the equations of `solveColumn` with Φᵢ(r) = Fᵢ/4πr²,   Fᵢ = 4πr_c² cᵢ nᵢ wᵢ at the exobase r_c
 *
 * For a trace gas in a fixed background Φ = w n_F/(1 + wJ), between the Jeans flux w n_F (wJ ≪ 1) and what diffusion
 * supplies, n_F/J (wJ ≫ 1).
 *
 * @param input      see `CoupledInput`
 * @param tolerance  error of ln p allowed in a step, between 1e-13 and 1e-2
 * @returns          column, exobase and rates; or why there is no exobase. Never anything else without saying so.
 *
 * @assumes  stationary, no chemistry, one temperature for all gases, Maxwellians under a sharp exobase
 * @valid    as long as the gas at the exobase is near rest: `escapeRegimeBounds`, `largestDrift`
 * @throws   PhysicsDomainError if an input breaks a bound, or if the criterion or a correction is of a gas not there
 * @source   [Hunten1973] for the limit by diffusion; [ChamberlainHunten1987], chapter 7
 */
export function solveCoupledColumn(input: CoupledInput, tolerance = defaultTolerance): CoupledOutcome {
  requireTolerance(tolerance);
  const before = slopeEvaluations();
  const column = escapingColumn(input);
  const answer = answerOf(input, column, tolerance);
  const evaluations = slopeEvaluations() - before;
  if (!answer.converged) return { ...answer, evaluations };
  return { ...answer, column: { ...answer.column, evaluations }, evaluations };
}

type Answer =
  | (Omit<Extract<CoupledOutcome, { converged: true }>, "column" | "evaluations"> & {
      column: UncountedColumn;
    })
  | Omit<Extract<CoupledOutcome, { converged: false }>, "evaluations">;

function answerOf(input: CoupledInput, column: EscapingColumn, tolerance: number): Answer {
  const atBase = faultAtBase(column);
  if (atBase !== null) return { ...atBase, marches: 0 };
  const guess = guessExobase(column);
  const largest = exponential(guess.largestLogNumber);
  if (guess.hasCrossing && guess.largestDepletion < negligibleDepletion) {
    const open = openAnswer(input, tolerance);
    if (open !== null) return open;
  }
  if (!guess.hasCrossing && largest < nearlyOne) return runaway(input, column, guess, 1, tolerance);
  const found = findCoupledExobase(column, guess, tolerance, guess.hasCrossing ? undefined : shortSearch);
  if (found.converged) return converged(input, column, found, tolerance, found.marches + 1);
  if (!guess.hasCrossing) return runaway(input, column, guess, found.marches + 1, tolerance);
  // A guess from which not even a march is possible is beyond what escape of another strength could mend.
  const walk = found.marches > 1 ? walkToExobase(column, tolerance) : { found: null, marches: 0 };
  const marches = 1 + found.marches + walk.marches;
  if (walk.found !== null) return converged(input, column, walk.found, tolerance, marches);
  return {
    converged: false,
    reason: found.reason === "turn" || found.reason === "runaway" ? found.reason : "not_converged",
    message: messageOf(column, found),
    largestKnudsen: largest,
    altitudeOfLargest: altitudeOf(column.problem, guess.heightOfLargest),
    marches,
  };
}

/** What is wrong with the base alone; null if nothing is. */
function faultAtBase({ problem, number }: EscapingColumn) {
  const { baseLogPressures, masses, input } = problem;
  const law = lawAt(problem, 0, baseLogPressures, 1);
  const baseNumber = exponential(logNumber(number, 0, law, baseLogPressures));
  setComposition(baseLogPressures, masses.length);
  const bound = boundParameter(problem, 0, law.temperaturePiece);
  const fault = faultOfBase(number.criterion, baseNumber, bound);
  if (fault === null) return null;
  const { baseAltitude } = input;
  return { converged: false, ...fault, largestKnudsen: baseNumber, altitudeOfLargest: baseAltitude } as const;
}

/** The column without flux, where escape changes nothing in it; null if it has no exobase after all. */
function openAnswer(input: CoupledInput, tolerance: number): Answer | null {
  const column = solveColumn(input, tolerance);
  const exobase = openExobase(input, column.exobaseBy(input.criterion), tolerance);
  if (!exobase.found) return null;
  const gases = escapingGases(input, exobase.level, new Float64Array(input.gases.length));
  return {
    converged: true,
    column: { ...column, exobase },
    exobase,
    gases,
    notes: coupledNotes(gases, exobase.level.altitude, column.topAltitude),
    marches: 1,
  };
}

/** The exobase without flux, wherever the top is. */
function openExobase(input: CoupledInput, within: ExobaseOutcome, tolerance: number): ExobaseOutcome {
  if (within.found || within.reason !== "top_below_exobase" || input.top === "auto") return within;
  const beyond = solveColumn({ ...input, top: "auto" }, tolerance).exobaseBy(input.criterion);
  return beyond.found ? { ...beyond, upper: null } : beyond;
}

function converged(
  input: CoupledInput,
  escaping: EscapingColumn,
  found: Extract<CoupledExobase, { converged: true }>,
  tolerance: number,
  marches: number,
): Answer {
  const { column, exobase, path } = coupledColumn(escaping, found, tolerance);
  const shares = new Float64Array(input.gases.length);
  supplyShares(path).forEach((share, i) => (shares[escaping.problem.present[i]] = share));
  const gases = escapingGases(input, exobase.level, shares);
  return {
    converged: true,
    column,
    exobase,
    gases,
    notes: coupledNotes(gases, exobase.level.altitude, column.topAltitude),
    marches: marches + 1,
  };
}

/** No exobase in sight. Where there is none without flux either, that column says it more exactly. */
function runaway(
  input: CoupledInput,
  { problem, number }: EscapingColumn,
  { largestLogNumber, heightOfLargest }: ExobaseGuess,
  marches: number,
  tolerance: number,
): Answer {
  const open = solveColumn({ ...input, top: "auto" }, tolerance).exobaseBy(input.criterion);
  const shared = { converged: false, reason: "runaway", marches: marches + 1 } as const;
  if (!open.found) {
    const { message, largestKnudsen, altitudeOfLargest } = open;
    return { ...shared, message, largestKnudsen, altitudeOfLargest };
  }
  const largestKnudsen = exponential(largestLogNumber);
  const altitudeOfLargest = altitudeOf(problem, heightOfLargest);
  const message =
    `With what escapes of its gases the column has no exobase: the ${nameOfNumber(number.criterion)} reaches about ` +
    `${largestKnudsen.toPrecision(2)}, at ${kilometres(altitudeOfLargest)}, and never 1; without escape it would at ` +
    `${kilometres(open.level.altitude)}. The gas leaves as a wind.`;
  return { ...shared, message, largestKnudsen, altitudeOfLargest };
}

function messageOf(
  { problem }: EscapingColumn,
  found: Extract<CoupledExobase, { converged: false }>,
): string {
  const place = `near ${kilometres(altitudeOf(problem, found.height))}`;
  switch (found.reason) {
    case "turn":
      return `There is no stationary hydrostatic exobase: ${place}, where the fluxes that leave fit the base, the gas grows denser upward compared with its scale height. It leaves as a wind.`;
    case "runaway":
      return `There is no stationary hydrostatic exobase: the search ended ${place}, where the gas is unbound. It leaves as a wind.`;
    case "no_descent":
    case "too_many_marches":
      return `No exobase was found whose escape fits the base: the search ended ${place} after ${found.marches} marches, off by ${found.residual.toExponential(1)} in ln p. The gas may leave as a wind; try other conditions near these to see whether an exobase exists.`;
  }
}

function kilometres(altitude: number): string {
  return `${Number((altitude / 1000).toPrecision(4))} km`;
}
