import { PhysicsDomainError } from "../errors";
import {
  denseCoefficients,
  denseRows,
  end,
  finishStep,
  interpolateStep,
  k1,
  k13,
  keepStages,
  keptStages,
  maximumDimension,
  start,
  takeStep,
} from "../numerics/dormandPrince";
import { logarithm } from "../numerics/elementary";
import { findRoot } from "../numerics/findRoot";
import { growthAfter, rememberStep, shrinkAfter, type StepMemory } from "../numerics/stepControl";
import { clearPath, emptyPath, makeRoom, nodeState, type ColumnPath } from "./columnPath";
import { altitudeOf, type ColumnProblem } from "./columnProblem";
import { bindColumn, columnSlope, type BaseFluxes } from "./columnSlope";
import { fractions, setComposition } from "./composition";
import { excessOverCeiling, lawAt, lawBeyond, nextStop, type StepLaw } from "./stepLaw";

/**
 * A march through a column, upward or downward, with steps that adapt to the error. Three things that the error
 * estimate cannot see are seen to here: steps are capped so that no gas appears or vanishes within one; knots
 * of T and K are landed on; and so is the height where K reaches its ceiling.
 */
export interface ColumnMarch {
  readonly path: ColumnPath;
  /** Error allowed in ln p of a gas, per step. */
  readonly tolerance: number;
  readonly direction: 1 | -1;
  /** Of the whole gas where the march began, in h, m. */
  readonly scaleHeight: number;
  /** The law of the next step. */
  law: StepLaw;
  /** Length of the next step, if nothing caps it, m. */
  step: number;
  readonly memory: StepMemory;
  /** d ln p/dh of each gas where the march stands, m⁻¹. */
  readonly slope: Float64Array;
}

export interface MarchStart {
  problem: ColumnProblem;
  fluxes: BaseFluxes | null;
  /** Geopotential height, m. */
  height: number;
  /** ln p of each present gas, ln Pa. */
  state: Float64Array;
  direction: 1 | -1;
  tolerance: number;
  /** A path that is no longer needed, of the same column and fluxes, to be written anew. */
  path?: ColumnPath;
  /** Length of the first step, m, if one is known that suits. */
  firstStep?: number;
}

/** First step, in scale heights. */
const usualFirstStep = 0.3;
/** Largest change within a step: of ln p, and of ln X of a gas that counts. */
const largestFall = 4;
const largestSeparation = 3;
/** ln 1e-9: above this ln X a gas counts. */
const countingLogFraction = logarithm(1e-9);
/** How exactly the ceiling of K is landed on, in x ln n. */
const ceilingTolerance = 1e-7;
/** A stop is taken along if the step grows by no more than this factor. */
const stretch = 1.05;
const stepLimit = 20000;

/** Sets out, without taking a step. */
export function beginMarch({
  problem,
  fluxes,
  height,
  state,
  direction,
  tolerance,
  path = emptyPath(problem, fluxes),
  firstStep,
}: MarchStart): ColumnMarch {
  clearPath(path);
  path.positions[0] = height;
  path.states.set(state);
  const law = lawAt(problem, height, state, direction);
  const slope = new Float64Array(maximumDimension);
  bindColumn(problem, fluxes, law);
  columnSlope(height, state, slope);
  setComposition(state, state.length);
  const scaleHeight = 1 / Math.abs(meanSlope(slope, state.length));
  const step = firstStep ?? usualFirstStep * scaleHeight;
  return { path, tolerance, direction, scaleHeight, law, step, memory: { step: 0, error: 1 }, slope };
}

/** Geopotential height at which a march stands, m. */
export function heightOfMarch({ path }: ColumnMarch): number {
  return path.positions[path.steps];
}

/**
 * Takes one step towards `limit`, which lies ahead, and never past it.
 *
 * @throws  PhysicsDomainError if the column cannot be passed in 20,000 steps
 */
export function advance(march: ColumnMarch, limit: number): void {
  const { path, direction, memory } = march;
  const { problem } = path;
  const position = heightOfMarch(march);
  refuseEndlessMarch(march);
  makeRoom(path);
  nodeState(path, path.steps, start);
  k1.set(march.slope);
  bindColumn(problem, path.fluxes, march.law);

  const stop = nextStop(problem, march.law, direction, limit);
  const room = direction * (stop - position);
  const { step, error, hasRejected } = takeAcceptableStep(march, position, room);
  const growth = growthAfter(step, error, memory);
  const nextStep = step * (hasRejected ? Math.min(1, growth) : growth);

  const ceiling = lengthToCeiling(march, position, step);
  const isStopped = ceiling === null && step === room;
  finishStep(columnSlope, position, direction * (ceiling ?? step));
  record(march, isStopped ? stop : position + direction * (ceiling ?? step));

  if (ceiling === null && !isStopped) {
    march.step = nextStep;
    rememberStep(memory, step, error);
    return;
  }
  // A step cut short says little about the next, which may be as long as this one was to be.
  march.step = hasRejected ? nextStep : Math.max(nextStep, march.step);
  putOnLaw(march, lawBeyond(problem, march.law, direction, heightOfMarch(march), ceiling !== null));
}

/** Shortens the step until its error is within the tolerance. */
function takeAcceptableStep(
  { path, tolerance, direction, step: wished }: ColumnMarch,
  position: number,
  room: number,
) {
  const size = path.problem.masses.length;
  let proposed = Math.min(wished, stepCap(start, k1, size, direction));
  for (let rejections = 0; ; rejections += 1) {
    const step = room <= stretch * proposed ? room : proposed;
    const error = takeStep(columnSlope, size, position, direction * step) / tolerance;
    if (error <= 1) return { step, error, hasRejected: rejections > 0 };
    proposed = step * shrinkAfter(error);
    if (!(Math.abs(position + direction * proposed - position) > 0)) refuseImpassable(path.problem, position);
  }
}

/** Goes on under another law, with the slope evaluated anew. */
function putOnLaw(march: ColumnMarch, law: StepLaw): void {
  if (law === march.law) return;
  march.law = law;
  bindColumn(march.path.problem, march.path.fluxes, law);
  columnSlope(heightOfMarch(march), end, march.slope);
}

/** Adds the finished step to the path. */
function record({ path, law, slope }: ColumnMarch, reached: number): void {
  const size = path.problem.masses.length;
  keepStages(size, path.stages, path.steps * keptStages * size);
  path.laws.push(law);
  path.steps += 1;
  path.positions[path.steps] = reached;
  for (let i = 0; i < size; i += 1) {
    path.states[path.steps * size + i] = end[i];
    slope[i] = k13[i];
  }
}

/**
 * The longest step within which no gas changes its part in the whole by too much.
 *
 * @param state  ln p of each gas where the step begins
 * @param slope  d ln p/dh of each gas there  [m⁻¹]
 * @returns      [m]
 */
export function stepCap(state: Float64Array, slope: Float64Array, size: number, direction: 1 | -1): number {
  const logPressure = setComposition(state, size);
  const fall = meanSlope(slope, size);
  let cap = largestFall / Math.abs(fall);
  for (let i = 0; i < size; i += 1) {
    const separation = slope[i] - fall;
    const logFraction = state[i] - logPressure;
    if (logFraction > countingLogFraction) {
      cap = Math.min(cap, largestSeparation / Math.abs(separation));
    } else if (direction * separation > 0) {
      cap = Math.min(cap, (countingLogFraction - logFraction + largestSeparation) / Math.abs(separation));
    }
  }
  return cap;
}

/** d ln p/dh of the whole gas, whose composition was just set. */
function meanSlope(slope: Float64Array, size: number): number {
  let mean = 0;
  for (let i = 0; i < size; i += 1) mean += fractions[i] * slope[i];
  return mean;
}

/**
 * Length from `start` to where K reaches or leaves its ceiling, if that lies within the step just taken, which
 * is then taken again to there; else null.
 */
function lengthToCeiling(
  { path, law, direction }: ColumnMarch,
  position: number,
  step: number,
): number | null {
  const { problem } = path;
  const size = problem.masses.length;
  const excessAt = (length: number, state: Float64Array) =>
    excessOverCeiling(problem, law.temperaturePiece, position + direction * length, state);
  const excess = excessAt(step, end);
  if (law.isCapped ? excess < ceilingTolerance : excess > -ceilingTolerance) return null;
  const afterStepOf = (length: number) => {
    takeStep(columnSlope, size, position, direction * length);
    return excessAt(length, end);
  };
  // Standing on the ceiling already: only the law changes.
  if (Math.abs(excessAt(0, start)) <= ceilingTolerance) {
    afterStepOf(0);
    return 0;
  }

  finishStep(columnSlope, position, direction * step);
  denseCoefficients(columnSlope, size, position, direction * step, landingDense, 0);
  const estimate = findRoot(
    (length) => {
      interpolateStep(landingDense, 0, size, start, 0, length / step, landingState);
      return excessAt(length, landingState);
    },
    0,
    step,
    { value: ceilingTolerance / 100, bracket: 0 },
  );
  if (estimate.converged && Math.abs(afterStepOf(estimate.root)) <= ceilingTolerance) return estimate.root;
  const exact = findRoot(afterStepOf, 0, step, { value: ceilingTolerance / 2, bracket: 0 });
  if (!exact.converged) return refuseImpassable(problem, position);
  afterStepOf(exact.root);
  return exact.root;
}

const landingDense = new Float64Array(denseRows * maximumDimension);
const landingState = new Float64Array(maximumDimension);

function refuseEndlessMarch(march: ColumnMarch): void {
  if (march.path.steps < stepLimit) return;
  const reached = altitudeOf(march.path.problem, heightOfMarch(march));
  throw new PhysicsDomainError("altitude reached", reached, `the top, in no more than ${stepLimit} steps`);
}

function refuseImpassable(problem: ColumnProblem, position: number): never {
  const requirement = "passable in steps that a number can tell apart";
  throw new PhysicsDomainError("altitude reached", altitudeOf(problem, position), requirement);
}
