import { advance, beginMarch, heightOfMarch, type ColumnMarch } from "../column/columnMarch";
import { emptyPath, nodeState, type ColumnPath } from "../column/columnPath";
import { bindColumn, columnSlope, slopeParts, type BaseFluxes } from "../column/columnSlope";
import { maximumGases, setComposition } from "../column/composition";
import { lawAt, type StepLaw } from "../column/stepLaw";
import { exponential } from "../numerics/elementary";
import { fluxSlopes, logFluxes, setFluxes } from "./escapeFluxes";
import type { EscapingColumn } from "./escapingColumn";

/**
 * A march from an exobase, taken for granted with its state, down to the base with the fluxes that escape from it. What
 * it arrives with, less what the base really has, is the residual that the right exobase brings to nothing. Downward a
 * column is stable: a trace gas arrives in proportion to what it set out with, however much of it escapes.
 */
export interface DownwardMarch {
  readonly column: EscapingColumn;
  /** Written anew by every march. */
  readonly path: ColumnPath;
  readonly fluxes: BaseFluxes;
  /** d ln Φ₀/dh of each gas at the exobase, at fixed ln p; whether or not the flux counts, m⁻¹. */
  readonly fluxSlopes: Float64Array;
  /** d ln p/dh of each gas at the exobase, m⁻¹. */
  readonly topSlope: Float64Array;
  /** ln p at the base less what it is given to be. */
  readonly residual: Float64Array;
  /** Length of the first step that suited last, m. */
  firstStep: number | undefined;
}

/** A flux that changes no gradient by more than this share of a scale height's is left out. */
const smallestShare = 1e-16;
/** ln X below which a share is too small for a number, and so is what its flux does. */
const smallestLogFraction = -690;

export function downwardMarch(column: EscapingColumn): DownwardMarch {
  const size = column.logSpeeds.length;
  const fluxes = new Float64Array(size);
  return {
    column,
    path: emptyPath(column.problem, fluxes),
    fluxes,
    fluxSlopes: new Float64Array(size),
    topSlope: new Float64Array(size),
    residual: new Float64Array(size),
    firstStep: undefined,
  };
}

/**
 * Marches down from an exobase.
 *
 * @param height     h   [m]  geopotential height of the exobase above the base, above zero
 * @param state      ln p of each present gas there  [ln Pa]
 * @param tolerance  error of ln p allowed in a step
 * @returns          the largest residual; NaN if the base could not be reached
 *
 * @throws  PhysicsDomainError if the column cannot be passed
 */
export function marchDown(
  down: DownwardMarch,
  height: number,
  state: Float64Array,
  tolerance: number,
): number {
  const { column, path, fluxes } = down;
  const { problem } = column;
  const law = lawAt(problem, height, state, -1);
  setFluxes(column, height, law.temperaturePiece, state);
  down.fluxSlopes.set(fluxSlopes.subarray(0, fluxes.length));
  chooseFluxes(down, law, height, state);
  const march = beginMarch({
    problem,
    fluxes,
    path,
    height,
    state,
    direction: -1,
    tolerance,
    firstStep: down.firstStep,
  });
  for (let i = 0; i < fluxes.length; i += 1) down.topSlope[i] = march.slope[i];
  descend(march, down);
  return residualOf(down);
}

function descend(march: ColumnMarch, down: DownwardMarch): void {
  const { path } = march;
  const height = heightOfMarch(march);
  while (heightOfMarch(march) > 0) {
    advance(march, 0);
    if (path.steps === 1) down.firstStep = height - path.positions[1];
  }
}

/** Sets the fluxes that count; the others are zero. */
function chooseFluxes(
  { column, fluxes }: DownwardMarch,
  law: StepLaw,
  height: number,
  state: Float64Array,
): void {
  const { problem } = column;
  const { masses, baseLogPressures } = problem;
  const size = masses.length;
  fluxes.fill(0);
  bindColumn(problem, fluxes, law);
  columnSlope(height, state, slopeHere);
  const { frictions } = slopeParts;
  largestFrictions.fill(0, 0, size);
  let pair = 0;
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j < i; j += 1) {
      largestFrictions[i] = Math.max(largestFrictions[i], frictions[pair]);
      largestFrictions[j] = Math.max(largestFrictions[j], frictions[pair]);
      pair += 1;
    }
  }
  const logPressure = setComposition(state, size);
  const baseLogPressure = setComposition(baseLogPressures, size);
  for (let i = 0; i < size; i += 1) {
    const logFraction = Math.min(state[i] - logPressure, baseLogPressures[i] - baseLogPressure);
    const share = exponential(logFluxes[i] - logFraction) * largestFrictions[i];
    const counts = share > smallestShare * masses[i] * slopeParts.weight();
    if (counts && logFraction > smallestLogFraction) fluxes[i] = exponential(logFluxes[i]);
  }
}

const slopeHere = new Float64Array(maximumGases);
const largestFrictions = new Float64Array(maximumGases);

function residualOf({ column, path, residual }: DownwardMarch): number {
  const { baseLogPressures } = column.problem;
  nodeState(path, path.steps, slopeHere);
  let largest = 0;
  for (let i = 0; i < residual.length; i += 1) {
    residual[i] = slopeHere[i] - baseLogPressures[i];
    if (Number.isNaN(residual[i])) return NaN;
    largest = Math.max(largest, Math.abs(residual[i]));
  }
  return largest;
}
