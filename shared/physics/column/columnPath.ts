import {
  denseCoefficients,
  denseRows,
  end,
  interpolateStep,
  keptStages,
  restoreStages,
  start,
} from "../numerics/dormandPrince";
import { altitudeOf, temperatureOf, type ColumnProblem } from "./columnProblem";
import { bindColumn, columnSlope, type BaseFluxes } from "./columnSlope";
import type { StepLaw } from "./stepLaw";

/**
 * A march through a column, kept step by step so that the state between steps can be had at any time later:
 * positions, states, the stages that the dense output rests on, and the law that held along each step. It owns
 * its arrays. Two marches that parted at an exobase are joined to one by `joinPaths`.
 */
export interface ColumnPath {
  readonly problem: ColumnProblem;
  readonly fluxes: BaseFluxes | null;
  /** Of a joined path: so many first steps were marched downward with the fluxes, the rest upward without; else 0. */
  readonly descent: number;
  /** Number of steps; there is one position and one state more. */
  steps: number;
  /** Geopotential heights h, m, in the order of the march. */
  positions: Float64Array;
  /** ln p of each gas at each position. */
  states: Float64Array;
  /** `keptStages` slopes of each gas for each step. */
  stages: Float64Array;
  laws: StepLaw[];
  /** Coefficients of the dense output of each step, made when first asked for, and whether they are. */
  dense: Float64Array;
  isDense: Uint8Array;
}

export function emptyPath(problem: ColumnProblem, fluxes: BaseFluxes | null): ColumnPath {
  const size = problem.masses.length;
  return {
    problem,
    fluxes,
    descent: 0,
    steps: 0,
    positions: new Float64Array(firstCapacity + 1),
    states: new Float64Array((firstCapacity + 1) * size),
    stages: new Float64Array(firstCapacity * keptStages * size),
    laws: [],
    dense: new Float64Array(firstCapacity * denseRows * size),
    isDense: new Uint8Array(firstCapacity),
  };
}

/** Makes a path one without steps, in the room that it has. */
export function clearPath(path: ColumnPath): void {
  path.steps = 0;
  path.laws.length = 0;
  path.isDense.fill(0);
}

/** Steps that a path has room for at first. */
const firstCapacity = 48;

/** Makes room for one more step. */
export function makeRoom(path: ColumnPath): void {
  if (path.steps + 1 < path.positions.length) return;
  const size = path.problem.masses.length;
  const capacity = 2 * path.steps;
  path.positions = extended(path.positions, capacity + 1);
  path.states = extended(path.states, (capacity + 1) * size);
  path.stages = extended(path.stages, capacity * keptStages * size);
  path.dense = extended(path.dense, capacity * denseRows * size);
  const isDense = new Uint8Array(capacity);
  isDense.set(path.isDense);
  path.isDense = isDense;
}

function extended(array: Float64Array, length: number): Float64Array {
  const longer = new Float64Array(length);
  longer.set(array);
  return longer;
}

/** Temperature at a height within a step, K. */
export function pathTemperature({ problem, laws }: ColumnPath, step: number, height: number): number {
  const altitude = altitudeOf(problem, height);
  return temperatureOf(problem.temperature, height, altitude, laws[step].temperaturePiece);
}

/** Makes the column, the fluxes and the law of a step those that `columnSlope` works on. */
export function bindStep({ problem, fluxes, descent, laws }: ColumnPath, step: number): void {
  bindColumn(problem, descent > 0 && step >= descent ? null : fluxes, laws[step]);
}

/** Index of the step that contains a height, for a path that was marched upward. */
export function stepAt({ positions, steps }: ColumnPath, height: number): number {
  let low = 0;
  let high = steps;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (positions[middle] <= height) low = middle;
    else high = middle;
  }
  return low;
}

/** Writes ln p of each gas at a position of the march. */
export function nodeState({ states, problem }: ColumnPath, node: number, out: Float64Array): void {
  const size = problem.masses.length;
  for (let i = 0; i < size; i += 1) out[i] = states[node * size + i];
}

/** Writes d ln p/dh of each gas at a position, as it is on the step above it, on the last one below. */
export function nodeSlope(path: ColumnPath, node: number, out: Float64Array): void {
  const { stages, steps, descent, problem } = path;
  const size = problem.masses.length;
  const isKeptFirst = node >= descent && node < steps;
  const place =
    ((isKeptFirst ? node : Math.min(node + 1, steps)) * keptStages - (isKeptFirst ? 0 : 1)) * size;
  for (let i = 0; i < size; i += 1) out[i] = stages[place + i];
}

/** Writes ln p of each gas at a height within a step, to the accuracy of the march. */
export function stateWithin(path: ColumnPath, step: number, height: number, out: Float64Array): void {
  const size = path.problem.masses.length;
  const isDownward = step < path.descent;
  const origin = isDownward ? step + 1 : step;
  const position = path.positions[origin];
  const length = path.positions[isDownward ? step : step + 1] - position;
  if (path.isDense[step] === 0) makeDense(path, step, origin, position, length);
  const place = step * denseRows * size;
  interpolateStep(path.dense, place, size, path.states, origin * size, (height - position) / length, out);
}

function makeDense(path: ColumnPath, step: number, origin: number, position: number, length: number): void {
  const size = path.problem.masses.length;
  const target = origin === step ? step + 1 : step;
  for (let i = 0; i < size; i += 1) {
    start[i] = path.states[origin * size + i];
    end[i] = path.states[target * size + i];
  }
  bindStep(path, step);
  restoreStages(size, path.stages, step * keptStages * size);
  denseCoefficients(columnSlope, size, position, length, path.dense, step * denseRows * size);
  path.isDense[step] = 1;
}
