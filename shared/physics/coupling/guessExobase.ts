import { boundParameter } from "../column/boundParameter";
import { stepCap } from "../column/columnMarch";
import { altitudeOf, temperatureOf } from "../column/columnProblem";
import { bindColumn, columnSlope, slopeParts, type BaseFluxes } from "../column/columnSlope";
import { fractions, maximumGases, setComposition } from "../column/composition";
import { farthestHeight, smallestLogPressure } from "../column/marchUp";
import { lawAt, type StepLaw } from "../column/stepLaw";
import { boltzmann } from "../constants/codata2022";
import { logNumberOfComposition, logNumberSlope } from "../exobase/exobaseNumber";
import { smallestBoundParameter } from "../exobase/findExobase";
import {
  denseCoefficients,
  denseRows,
  end,
  finishStep,
  interpolateStep,
  k1,
  k13,
  maximumDimension,
  start,
  takeStep,
} from "../numerics/dormandPrince";
import { exponential, log1p, logarithm } from "../numerics/elementary";
import { findRoot } from "../numerics/findRoot";
import { pieceAt } from "../numerics/piecewiseCubic";
import { growthAfter, rememberStep, shrinkAfter } from "../numerics/stepControl";
import { logFluxes, setFluxes, setVelocities, velocitySlopes } from "./escapeFluxes";
import type { EscapingColumn } from "./escapingColumn";

/**
 * Where the exobase of a coupled column should be, by one march upward that knows the escape at every height. For a
 * trace gas in a fixed background the flux that leaves a height h is Φ₀ = wₕn_F(h)/(1 + wJ), n_F the density without
 * flux, so that the density left there is
 *
 *   n = n_F/(1 + wJ),   J = n_F ∫ dh/[(D + K) n_F],   (ln J)′ = (ln n_F)′ + 1/[(D + K)J]
 *
 * (w referred to the base). The march is of ln p_F and ln J of each gas; m̄, friction and K at a height are those of
 * the composition left there. A trace gas comes out exact to the tolerance of the march, others nearly so.
 */
export interface ExobaseGuess {
  /** Whether the number of the criterion rose through 1; else the state is that where it was largest. */
  hasCrossing: boolean;
  height: number;
  state: Float64Array;
  /** Largest wJ of any gas there. */
  largestDepletion: number;
  /** The largest ln of the number met, and where. */
  largestLogNumber: number;
  heightOfLargest: number;
}

/** Error of ln p and ln J allowed in a step. */
const usualTolerance = 1e-3;
/** Height of the start over the base, in scale heights: J is nothing at the base itself. */
const startOfMarch = 0.05;
const endOfMarch = logarithm(10);
/** Where a flux drags another gas by more than this, in ln p up to the exobase, the march is repeated with it. */
const smallDrag = 0.1;
const settledDrag = 0.05;
const repetitions = 3;
const subsamples = 8;
const stepLimit = 3000;
/** ln J of a gas that nothing else is there to hold back. */
const smallestLogJ = -600;

let column: EscapingColumn;
let drag: BaseFluxes;
let tolerance = usualTolerance;
let size = 0;
let piece = 0;
/** kT, as `setDepleted` left it. */
const thermal = new Float64Array(1);
/** ln p of what is left of each gas, and the share wJ/(1 + wJ) that is gone, as `setDepleted` left them. */
const depleted = new Float64Array(maximumGases);
const gone = new Float64Array(maximumGases);
const depletedSlopes = new Float64Array(maximumGases);
/** 1/(D + K) of each gas, s m⁻², as `depletedSlope` left them. */
const conductances = new Float64Array(maximumGases);

/**
 * Guesses the exobase.
 *
 * @param accuracy  error of ln p and ln J allowed in a step
 */
export function guessExobase(escaping: EscapingColumn, accuracy = usualTolerance): ExobaseGuess {
  column = escaping;
  tolerance = accuracy;
  size = escaping.problem.masses.length;
  drag = new Float64Array(size);
  let guess = marchDepleted();
  let largest = dragOf(guess);
  for (let k = 0; k < repetitions && guess.hasCrossing && largest > smallDrag; k += 1) {
    for (let i = 0; i < size; i += 1) drag[i] = exponential(logFluxes[i]);
    guess = marchDepleted();
    const before = largest;
    largest = dragOf(guess);
    if (Math.abs(largest - before) < settledDrag * before) break;
  }
  return guess;
}

/** The largest change of ln p of a gas up to the exobase by the fluxes of the others; sets `logFluxes`. */
function dragOf({ height, state }: ExobaseGuess): number {
  const { problem } = column;
  const law = lawAt(problem, height, state, 1);
  setFluxes(column, height, law.temperaturePiece, state);
  bindColumn(problem, drag, law, true);
  columnSlope(height, state, depletedSlopes);
  const { frictions } = slopeParts;
  const sums = new Float64Array(size);
  let pair = 0;
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j < i; j += 1) {
      sums[i] += exponential(logFluxes[j]) * frictions[pair];
      sums[j] += exponential(logFluxes[i]) * frictions[pair];
      pair += 1;
    }
  }
  return height * Math.max(...sums);
}

/**
 * Sets what is left of each gas at a height where the state of the march is ln p_F and ln J.
 *
 * @returns  ln of the pressure of what is left, whose composition is set
 */
function setDepleted(height: number, state: Float64Array): number {
  const { problem, logSpeeds } = column;
  const { input, masses, baseRadius, temperature: along } = problem;
  const stretch = baseRadius / (baseRadius - height);
  const altitude = altitudeOf(problem, height);
  piece = along.kind === "points" ? pieceAt(along.heights, height, true) : 0;
  const temperature = temperatureOf(along, height, altitude, piece);
  const thermalEnergy = boltzmann.value * temperature;
  thermal[0] = thermalEnergy;
  const lambdaOfUnitMass = input.gravitationalParameter / (thermalEnergy * (input.radius + altitude));
  const shared = logarithm(temperature * stretch * stretch * stretch * stretch) / 2;
  for (let i = 0; i < size; i += 1) {
    const lambda = lambdaOfUnitMass * masses[i];
    const exponent = logSpeeds[i] + shared - lambda + state[size + i];
    if (exponent > 36) {
      depleted[i] = state[i] - exponent - log1p(lambda);
      gone[i] = 1;
    } else if (exponent < -60) {
      depleted[i] = state[i];
      gone[i] = 0;
    } else {
      const depletion = exponential(exponent) * (1 + lambda);
      depleted[i] = state[i] - log1p(depletion);
      gone[i] = depletion / (1 + depletion);
    }
  }
  return setComposition(depleted, size);
}

/** The law where T, its piece and the pressure are those that `setDepleted` left. */
function lawOfDepleted(height: number, logPressure: number): StepLaw {
  const { eddy } = column.problem;
  const eddyPiece = eddy.kind === "points" ? pieceAt(eddy.heights, height, true) : 0;
  const isCapped =
    eddy.kind === "power" &&
    eddy.ceiling !== null &&
    eddy.exponent * (logPressure - logarithm(thermal[0]) - eddy.ceiling.logDensity) <= 0;
  return { isCapped, temperaturePiece: piece, eddyPiece };
}

/** The right-hand side of the march. */
function depletedSlope(height: number, state: Float64Array, slope: Float64Array): void {
  const logPressure = setDepleted(height, state);
  bindColumn(column.problem, drag, lawOfDepleted(height, logPressure), true);
  columnSlope(height, depleted, slope);
  const { resistances } = slopeParts;
  const density = exponential(logPressure) / thermal[0];
  const kappa = slopeParts.kappa();
  const warming = slopeParts.warming();
  for (let i = 0; i < size; i += 1) {
    conductances[i] = (density * resistances[i]) / (1 + kappa * resistances[i]);
    const gain = conductances[i] === 0 ? 0 : conductances[i] * exponential(-state[size + i]);
    slope[size + i] = slope[i] - warming + gain;
  }
}

/** What is to be known where a step ends. */
interface Waymark {
  logNumber: number;
  /** d ln of the number/dh, m⁻¹. */
  slope: number;
  logKnudsen: number;
  /** Whether Kn falls and the gas is unbound. */
  runsAway: boolean;
  isThin: boolean;
  /** Longest step from here, m. */
  cap: number;
}

/** @param slope  of the march at that state */
function waymarkAt(height: number, state: Float64Array, slope: Float64Array): Waymark {
  const { problem, number, bulk } = column;
  const logPressure = setDepleted(height, state);
  const law = lawOfDepleted(height, logPressure);
  setVelocities(column, height, piece);
  for (let i = 0; i < size; i += 1) {
    depletedSlopes[i] = slope[i] - gone[i] * (velocitySlopes[i] + slope[size + i]);
  }
  const cap = stepCap(depleted, depletedSlopes, size, 1);
  const logNumber = logNumberOfComposition(number, height, law, logPressure);
  const numberSlope = logNumberSlope(number, height, law, depletedSlopes);
  const isBulk = number === bulk;
  const bulkSlope = isBulk ? numberSlope : logNumberSlope(bulk, height, law, depletedSlopes);
  return {
    logNumber,
    slope: numberSlope,
    logKnudsen: isBulk ? logNumber : logNumberOfComposition(bulk, height, law, logPressure),
    runsAway: bulkSlope < 0 && boundParameter(problem, height, law.temperaturePiece) < smallestBoundParameter,
    isThin: logPressure < smallestLogPressure,
    cap,
  };
}

/** One march from the base to beyond the exobase, or as far as there is gas that is held. */
function marchDepleted(): ExobaseGuess {
  const limit = farthestHeight(column.problem);
  let position = setOut();
  let step = position;
  let here = waymarkAt(position, start, k1);
  const memory = { step: 0, error: 1 };
  const guess = emptyGuess();
  consider(guess, here.logNumber, position);
  for (let steps = 0; steps < stepLimit && position < limit; steps += 1) {
    const taken = takeStepUp(position, Math.min(step, here.cap), limit);
    if (taken === null) break;
    finishStep(depletedSlope, position, taken.step);
    step = taken.step * growthAfter(taken.step, taken.error, memory);
    rememberStep(memory, taken.step, taken.error);
    const there = waymarkAt(position + taken.step, end, k13);
    lookWithin(guess, position, taken.step, here, there);
    here = there;
    position += taken.step;
    start.set(end);
    k1.set(k13);
    if (here.isThin || here.runsAway || (here.logKnudsen > endOfMarch && guess.hasCrossing)) break;
  }
  return guess;
}

/** Loads `start` and `k1` a little above the base, by the slopes halfway; returns the height. */
function setOut(): number {
  const { baseLogPressures } = column.problem;
  start.set(baseLogPressures);
  start.fill(smallestLogJ, size, 2 * size);
  depletedSlope(0, start, k1);
  let fall = 0;
  for (let i = 0; i < size; i += 1) fall += fractions[i] * k1[i];
  const height = startOfMarch / Math.abs(fall);
  for (let i = 0; i < size; i += 1) {
    start[i] += (height / 2) * k1[i];
    start[size + i] = logJ(height / 2, i);
  }
  depletedSlope(height / 2, start, k1);
  const warming = slopeParts.warming();
  for (let i = 0; i < size; i += 1) {
    start[i] = baseLogPressures[i] + height * k1[i];
    start[size + i] = logJ(height, i) + ((k1[i] - warming) * height) / 2;
  }
  depletedSlope(height, start, k1);
  return height;
}

/** ln J a little above the base, where the conductance is about what was set last. */
function logJ(height: number, gas: number): number {
  return Math.max(smallestLogJ, logarithm(height * conductances[gas]));
}

function takeStepUp(position: number, wished: number, limit: number): { step: number; error: number } | null {
  let proposed = wished;
  for (;;) {
    const step = Math.min(proposed, limit - position);
    const error = takeStep(depletedSlope, 2 * size, position, step) / tolerance;
    if (error <= 1) return { step, error };
    proposed = step * shrinkAfter(error);
    if (!(proposed > 1e-9 * position)) return null;
  }
}

function emptyGuess(): ExobaseGuess {
  return {
    hasCrossing: false,
    height: 0,
    state: new Float64Array(size),
    largestDepletion: 0,
    largestLogNumber: -Infinity,
    heightOfLargest: 0,
  };
}

/** Looks for the exobase, and for the largest number, within a step just finished. */
function lookWithin(
  guess: ExobaseGuess,
  position: number,
  step: number,
  here: Waymark,
  there: Waymark,
): void {
  const onlyRises = here.slope > 0 && there.slope > 0;
  if (onlyRises && here.logNumber >= 0 === there.logNumber >= 0) {
    consider(guess, there.logNumber, position + step);
    return;
  }
  denseCoefficients(depletedSlope, 2 * size, position, step, dense, 0);
  const valueAt = (part: number) => {
    const height = position + part * step;
    interpolateStep(dense, 0, 2 * size, start, 0, part, within);
    const logPressure = setDepleted(height, within);
    return logNumberOfComposition(column.number, height, lawOfDepleted(height, logPressure), logPressure);
  };
  const parts = onlyRises ? 1 : subsamples;
  let valueBelow = here.logNumber;
  for (let part = 1; part <= parts; part += 1) {
    const value = onlyRises ? there.logNumber : valueAt(part / parts);
    const isWanted = !guess.hasCrossing || here.logKnudsen < endOfMarch;
    if (valueBelow < 0 && value >= 0 && isWanted) {
      const found = findRoot(valueAt, (part - 1) / parts, part / parts, rootTolerance);
      if (found.converged) {
        valueAt(found.root);
        settle(guess, position + found.root * step);
        guess.hasCrossing = true;
      }
    }
    consider(guess, value, position + (part / parts) * step);
    valueBelow = value;
  }
}

/** Takes what is left at a height as the guess. */
function settle(guess: ExobaseGuess, height: number): void {
  guess.height = height;
  guess.largestDepletion = 0;
  for (let i = 0; i < size; i += 1) {
    guess.state[i] = depleted[i];
    guess.largestDepletion = Math.max(guess.largestDepletion, gone[i]);
  }
}

/** Remembers where the number is largest and, as long as it did not pass 1, the state there. */
function consider(guess: ExobaseGuess, logNumber: number, height: number): void {
  if (!(logNumber > guess.largestLogNumber)) return;
  guess.largestLogNumber = logNumber;
  guess.heightOfLargest = height;
  if (!guess.hasCrossing) settle(guess, height);
}

const rootTolerance = { value: 1e-6, bracket: 1e-9 };
const dense = new Float64Array(denseRows * maximumDimension);
const within = new Float64Array(maximumDimension);
