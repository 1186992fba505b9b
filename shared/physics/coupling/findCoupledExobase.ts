import { boundParameter } from "../column/boundParameter";
import { fractions, maximumGases, setComposition } from "../column/composition";
import { farthestHeight } from "../column/marchUp";
import { lawAt } from "../column/stepLaw";
import { PhysicsDomainError } from "../errors";
import { logNumber, logNumberGradient, logNumberSlope } from "../exobase/exobaseNumber";
import { logarithm } from "../numerics/elementary";
import { solveLinear } from "../numerics/solveLinear";
import type { EscapingColumn } from "./escapingColumn";
import { downwardMarch, marchDown, type DownwardMarch } from "./marchDown";
import { marchJacobian } from "./marchJacobian";

/** The exobase from which the fluxes that it lets go lead down to the given base; or why none was found. */
export type CoupledExobase =
  | {
      converged: true;
      height: number;
      /** ln p of each present gas there. */
      state: Float64Array;
      /** Marched from there. */
      down: DownwardMarch;
      marches: number;
    }
  | {
      converged: false;
      reason: "turn" | "runaway" | "no_descent" | "too_many_marches";
      /** Where the search stood, m of geopotential height, and the largest residual there. */
      height: number;
      residual: number;
      marches: number;
    };

/** March tolerance of the first try, and of those whose residual will be large in any case. */
const loosest = 1e-6;
/** What a change leaves of itself: by the error of the Jacobian, or by itself again. */
const jacobianError = 1e-4;
/** March tolerance as a share of the residual expected; where it comes below the limit, the march is made for good. */
const looseShare = 1e-3;
const loosestForGood = 1e-7;
/** Residuals of up to so many times the tolerance of their marches are not compared. */
const noise = 100;
/** After the first, loose march one with so many times the tolerance, which leaves no more than the last can mend. */
const nearly = 20;
/** Largest change in one turn: of ln p of a gas, or of the height in scale heights. */
const largestChange = 3;
/** A gas of which there is less, before and after, may change by more. */
const countingFraction = 1e-6;
/** In the first turns the Jacobian along the march is made anew, as long as the residual is larger than this. */
const renewals = 3;
const smallResidual = 1e-2;
/** Residuals of up to so many times the tolerance of a loose march may come from its looseness. */
const doubtful = 1e4;
/** A change has to bring the residual down by this share of itself; else it is cut by `damping`, so many times. */
const enoughDecrease = 0.1;
const damping = 0.35;
const dampings = 2;
const differencesLimit = 6;
const increment = 1e-4;
const differenceTolerance = 1e-8;
/** Done when nothing would change by more than so many tolerances, or all residuals are as small as one twice. */
const closeness = 20;
/** Below this escape parameter of the mean mass, where the gas would drift at over a fifth of √(kT/m), none is tried. */
const smallestBound = 1.5;
const usualLimit = 80;

/** An exobase that was tried. */
interface Trial {
  height: number;
  state: Float64Array;
  residual: Float64Array;
  /** The largest of it; Infinity where the march could not reach the base. */
  norm: number;
  /** Of its march. */
  tolerance: number;
}

interface Search {
  readonly column: EscapingColumn;
  readonly size: number;
  readonly tolerance: number;
  readonly down: DownwardMarch;
  marches: number;
  /** Where the last march set out. */
  lastHeight: number;
  /** Whether a trial was refused since the gas would be unbound there. */
  metUnbound: boolean;
  /** Whether the last turn left no more than the errors of its march. */
  isNoise: boolean;
  /** In which changes of the height are counted, m. */
  scale: number;
  /** Row by gas; columns by ln p of each gas at the exobase and by its height in `scale`. */
  readonly jacobian: Float64Array;
  /** What Newton's method would change. */
  readonly change: Float64Array;
}

/**
 * Finds the exobase of a coupled column: unknown are its height and ln p of every gas there; known that the number
 * of the criterion is 1, and what a march down has to arrive with. Newton's method, with a Jacobian from the march that
 * Broyden's rule keeps up; damped; and with one from differences where that does not help.
 *
 * @param guess      near the exobase; state in ln Pa
 * @param tolerance  of ln p per step of the last marches
 * @param limit      number of marches after which to give up
 *
 * @source [Broyden1965]
 */
export function findCoupledExobase(
  column: EscapingColumn,
  guess: { height: number; state: Float64Array },
  tolerance: number,
  limit = usualLimit,
): CoupledExobase {
  const search = beginSearch(column, tolerance);
  let here = tryExobase(search, guess.height, guess.state, Math.max(tolerance, loosest));
  if (here.norm === Infinity) return failure(search, here, search.metUnbound ? "runaway" : "no_descent");
  search.scale = scaleHeightOfMarch(search, here);
  renewJacobian(search);
  let differences = 0;
  let triedDifferences = false;

  for (let turn = 1; search.marches < limit; turn += 1) {
    if (!setChange(search, here)) return failure(search, here, "no_descent");
    if (isSettled(search, here)) return settled(search, here);
    const next = improve(search, here);
    if (next !== null) {
      if (turn < renewals && next.norm > smallResidual) renewJacobian(search);
      else updateJacobian(search, here, next);
      here = next;
      triedDifferences = false;
      continue;
    }
    if (triedDifferences || differences === differencesLimit) {
      return failure(search, here, search.metUnbound ? "runaway" : "no_descent");
    }
    triedDifferences = true;
    differences += 1;
    here = differenceJacobian(search, here);
    if (here.norm === Infinity) return failure(search, here, "no_descent");
  }
  return failure(search, here, "too_many_marches");
}

function beginSearch(column: EscapingColumn, tolerance: number): Search {
  const size = column.logSpeeds.length;
  return {
    column,
    size,
    tolerance,
    down: downwardMarch(column),
    marches: 0,
    lastHeight: 0,
    metUnbound: false,
    isNoise: false,
    scale: 1,
    jacobian: new Float64Array(size * (size + 1)),
    change: new Float64Array(size + 1),
  };
}

/** Marches down from an exobase, whose pressures are first made to meet the criterion. */
function tryExobase(search: Search, height: number, state: Float64Array, tolerance: number): Trial {
  const { column, down, size } = search;
  const excess = logNumber(column.number, height, lawAt(column.problem, height, state, -1), state);
  const shifted = state.map((value) => value + excess);
  const isHopeless = isUnbound(search, height, shifted);
  if (isHopeless) search.metUnbound = true;
  const norm = isHopeless ? Infinity : march(search, height, shifted, tolerance);
  return { height, state: shifted, residual: down.residual.slice(0, size), norm, tolerance };
}

/** The largest residual of a march down; Infinity where the base cannot be reached. */
function march(search: Search, height: number, state: Float64Array, tolerance: number): number {
  search.marches += 1;
  search.lastHeight = height;
  return finiteOr(Infinity, () => marchDown(search.down, height, state, tolerance));
}

/** A number that a computation gives; the other where it gives none, or breaks a bound of the physics. */
function finiteOr(other: number, compute: () => number): number {
  try {
    const value = compute();
    return Number.isFinite(value) ? value : other;
  } catch (error) {
    if (error instanceof PhysicsDomainError) return other;
    throw error;
  }
}

/** Scale height of the whole gas at the exobase just marched from, in h. */
function scaleHeightOfMarch({ down, size }: Search, { state }: Trial): number {
  setComposition(state, size);
  let fall = 0;
  for (let i = 0; i < size; i += 1) fall += fractions[i] * down.topSlope[i];
  return 1 / Math.abs(fall);
}

/** Whether the gas drifts off so fast that no hydrostatic column leads there. */
function isUnbound({ column, size }: Search, height: number, state: Float64Array): boolean {
  const { temperaturePiece } = lawAt(column.problem, height, state, -1);
  setComposition(state, size);
  return boundParameter(column.problem, height, temperaturePiece) < smallestBound;
}

/** Makes the Jacobian along the march just made. */
function renewJacobian({ down, jacobian, size, scale }: Search): void {
  marchJacobian(down, jacobian);
  for (let i = 0; i < size; i += 1) jacobian[i * (size + 1) + size] *= scale;
}

/** Solves for the change that brings the residual to nothing and keeps to the criterion; false if there is none. */
function setChange(
  { column, jacobian, change, size, scale }: Search,
  { height, state, residual }: Trial,
): boolean {
  const unknowns = size + 1;
  matrix.set(jacobian);
  const law = lawAt(column.problem, height, state, -1);
  setComposition(state, size);
  const lastRow = matrix.subarray(size * unknowns, unknowns * unknowns);
  lastRow[size] = logNumberGradient(column.number, height, law, lastRow) * scale;
  for (let i = 0; i < size; i += 1) change[i] = -residual[i];
  change[size] = 0;
  return solveLinear(matrix, unknowns, change, 1);
}

const matrix = new Float64Array((maximumGases + 1) * (maximumGases + 1));

/** The state after a part of the change. */
function moved({ change, size, scale }: Search, { height, state }: Trial, part: number) {
  return {
    height: height + part * change[size] * scale,
    state: state.map((value, i) => value + part * change[i]),
  };
}

/** The part of the change that may be taken at once, and the largest change that counts. */
function allowedPart(search: Search, here: Trial): { part: number; largest: number } {
  const { column, change, size, scale } = search;
  const logCounting = setComposition(here.state, size);
  let largest = Math.abs(change[size]);
  for (let i = 0; i < size; i += 1) {
    const staysRare =
      fractions[i] < countingFraction && here.state[i] + change[i] < logCounting + logOfCountingFraction;
    if (!staysRare) largest = Math.max(largest, Math.abs(change[i]));
  }
  const rise = change[size] * scale;
  const room = rise > 0 ? (farthestHeight(column.problem) - here.height) / 2 : here.height / 2;
  const part = Math.min(1, largestChange / largest, room / Math.abs(rise));
  return { part, largest: part * largest };
}

const logOfCountingFraction = logarithm(countingFraction);

/** A trial with a smaller residual in the direction of the change; null if there is none near. */
function improve(search: Search, here: Trial): Trial | null {
  const { part, largest } = allowedPart(search, here);
  const expected = largest * Math.max(jacobianError, Math.min(1, largest));
  const wished = Math.min(loosest, looseShare * expected);
  const nearlyGood = nearly * search.tolerance;
  const finest = here.tolerance > nearlyGood ? nearlyGood : search.tolerance;
  const loose = Math.max(finest, wished < loosestForGood ? 0 : wished);
  let share = part;
  for (let cut = 0; cut <= dampings; cut += 1) {
    const next = moved(search, here, share);
    const trial = tryExobase(search, next.height, next.state, loose);
    if (isBetter(trial, here, share)) return trial;
    if (loose > search.tolerance && trial.norm < doubtful * loose) {
      // A loose march may be what does not improve.
      const finer = tryExobase(search, next.height, next.state, search.tolerance);
      if (isBetter(finer, here, share)) return finer;
    }
    share *= damping;
  }
  return null;
}

function isBetter(trial: Trial, here: Trial, share: number): boolean {
  const floor = noise * Math.max(here.tolerance, trial.tolerance);
  return trial.norm <= floor || trial.norm < here.norm * (1 - enoughDecrease * share);
}

/** Broyden's rule: the Jacobian that differs least and explains the last change. */
function updateJacobian({ jacobian, size, scale }: Search, before: Trial, after: Trial): void {
  const unknowns = size + 1;
  let square = 0;
  for (let k = 0; k < size; k += 1) {
    taken[k] = after.state[k] - before.state[k];
    square += taken[k] * taken[k];
  }
  taken[size] = (after.height - before.height) / scale;
  square += taken[size] * taken[size];
  if (square === 0) return;
  for (let i = 0; i < size; i += 1) {
    let unexplained = after.residual[i] - before.residual[i];
    for (let k = 0; k < unknowns; k += 1) unexplained -= jacobian[i * unknowns + k] * taken[k];
    for (let k = 0; k < unknowns; k += 1) jacobian[i * unknowns + k] += (unexplained * taken[k]) / square;
  }
}

const taken = new Float64Array(maximumGases + 1);

/** Makes the Jacobian by marching from slightly changed exobases; the same exobase, marched from as finely. */
function differenceJacobian(search: Search, { height, state }: Trial): Trial {
  const { down, jacobian, size, scale, tolerance } = search;
  const unknowns = size + 1;
  const fine = Math.max(tolerance, differenceTolerance);
  const here = tryExobase(search, height, state, fine);
  for (let k = 0; k < unknowns && here.norm < Infinity; k += 1) {
    const changed = here.state.map((value, i) => value + (i === k ? increment : 0));
    const changedHeight = k === size ? height + increment * scale : height;
    const norm = march(search, changedHeight, changed, fine);
    if (norm === Infinity) return { ...here, norm };
    for (let i = 0; i < size; i += 1) {
      jacobian[i * unknowns + k] = (down.residual[i] - here.residual[i]) / increment;
    }
  }
  return here;
}

/** Whether nothing would change by more than it should, or the residual has been nothing but noise before. */
function isSettled(search: Search, here: Trial): boolean {
  const { change, size, tolerance } = search;
  if (here.tolerance > tolerance) return false;
  let largest = 0;
  for (let k = 0; k <= size; k += 1) largest = Math.max(largest, Math.abs(change[k]));
  if (largest <= closeness * tolerance) return true;
  const wasNoise = search.isNoise;
  search.isNoise = here.norm <= tolerance;
  return wasNoise && search.isNoise;
}

/** An exobase that was reached is the one, if the number rises there. */
function settled(search: Search, { height, state, norm, tolerance }: Trial): CoupledExobase {
  const { column, down, size } = search;
  if (search.lastHeight !== height) tryExobase(search, height, state, tolerance);
  const { marches } = search;
  const law = lawAt(column.problem, height, state, -1);
  setComposition(state, size);
  if (logNumberSlope(column.number, height, law, down.topSlope) > 0) {
    return { converged: true, height, state, down, marches };
  }
  return { converged: false, reason: "turn", height, residual: norm, marches };
}

function failure(
  { marches }: Search,
  { height, norm }: Trial,
  reason: Extract<CoupledExobase, { converged: false }>["reason"],
): CoupledExobase {
  return { converged: false, reason, height, residual: norm, marches };
}
