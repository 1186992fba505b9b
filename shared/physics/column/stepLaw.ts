import { boltzmann } from "../constants/codata2022";
import { logarithm } from "../numerics/elementary";
import { pieceAt } from "../numerics/piecewiseCubic";
import {
  altitudeOf,
  temperatureOf,
  type ColumnProblem,
  type EddyAlong,
  type TemperatureAlong,
} from "./columnProblem";
import { setComposition } from "./composition";

/** The law that holds along a step: knots and the ceiling of K are landed on, so it never changes within one. */
export interface StepLaw {
  /** Whether K is at its ceiling. */
  readonly isCapped: boolean;
  /** Pieces of T and of K, where these are points. */
  readonly temperaturePiece: number;
  readonly eddyPiece: number;
}

/** The nearest of the limit and the knots ahead. */
export function nextStop(problem: ColumnProblem, law: StepLaw, direction: 1 | -1, limit: number): number {
  const temperatureKnot = knotAhead(problem.temperature, law.temperaturePiece, direction);
  const eddyKnot = knotAhead(problem.eddy, law.eddyPiece, direction);
  const nearest = direction > 0 ? Math.min : Math.max;
  return nearest(limit, temperatureKnot, eddyKnot);
}

/** The law that holds beyond a knot or, if `isCeiling`, beyond the ceiling of K; the same one elsewhere. */
export function lawBeyond(
  problem: ColumnProblem,
  law: StepLaw,
  direction: 1 | -1,
  height: number,
  isCeiling: boolean,
): StepLaw {
  const isPastTemperature = knotAhead(problem.temperature, law.temperaturePiece, direction) === height;
  const isPastEddy = knotAhead(problem.eddy, law.eddyPiece, direction) === height;
  if (!isCeiling && !isPastTemperature && !isPastEddy) return law;
  return {
    isCapped: law.isCapped !== isCeiling,
    temperaturePiece: law.temperaturePiece + (isPastTemperature ? direction : 0),
    eddyPiece: law.eddyPiece + (isPastEddy ? direction : 0),
  };
}

/** Height of the knot at which the present piece ends. */
function knotAhead(along: TemperatureAlong | EddyAlong, piece: number, direction: 1 | -1): number {
  const k = direction > 0 ? piece : piece - 1;
  return along.kind === "points" && k >= 0 && k < along.heights.length
    ? along.heights[k]
    : direction * Infinity;
}

/** The law that holds from a height on. */
export function lawAt(
  problem: ColumnProblem,
  height: number,
  state: Float64Array,
  direction: 1 | -1,
): StepLaw {
  const { temperature, eddy } = problem;
  const isUpward = direction > 0;
  const temperaturePiece = temperature.kind === "points" ? pieceAt(temperature.heights, height, isUpward) : 0;
  const eddyPiece = eddy.kind === "points" ? pieceAt(eddy.heights, height, isUpward) : 0;
  const isCapped = !(excessOverCeiling(problem, temperaturePiece, height, state) > 0);
  return { isCapped, temperaturePiece, eddyPiece };
}

/** x ln(n/n_c): above zero where the power law of K holds, below where its ceiling does. */
export function excessOverCeiling(
  problem: ColumnProblem,
  piece: number,
  height: number,
  state: Float64Array,
): number {
  const { temperature, eddy } = problem;
  if (eddy.kind !== "power" || eddy.ceiling === null) return Infinity;
  const altitude = altitudeOf(problem, height);
  const thermalEnergy = boltzmann.value * temperatureOf(temperature, height, altitude, piece);
  const logDensity = setComposition(state, problem.masses.length) - logarithm(thermalEnergy);
  return eddy.exponent * (logDensity - eddy.ceiling.logDensity);
}
