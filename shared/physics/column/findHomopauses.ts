import { boltzmann } from "../constants/codata2022";
import { maximumDimension } from "../numerics/dormandPrince";
import { exponential, logarithm } from "../numerics/elementary";
import { findRoot, rootOf } from "../numerics/findRoot";
import type { HomopauseOutcome } from "../types";
import { nodeState, pathTemperature, stateWithin, stepAt, type ColumnPath } from "./columnPath";
import { altitudeOf, eddyOf } from "./columnProblem";

export interface Homopause {
  outcome: HomopauseOutcome;
  /** Altitudes of further crossings, m. */
  otherAltitudes: number[];
}

/**
 * The homopause of every gas: the altitude where its diffusion coefficient by Blanc's law passes the eddy
 * coefficient,
 *
 *   Dᵢ = K,   Dᵢ = (1 − Xᵢ) / Σⱼ (Xⱼ/Dᵢⱼ),  j ≠ i;
 *
 * of several, the last one that is passed upward from mixed to separated, else the last.
 *
 * @param path  marched upward
 * @param top   geopotential height up to which is looked, m
 *
 * @source [Blanc1908]
 * @explained homopause_altitude
 */
export function findHomopauses(path: ColumnPath, top: number): Homopause[] {
  const { input, present, eddy } = path.problem;
  const gases = input.gases.map((_, gas) => gas);
  const hasOthers = (gas: number) => present.length > 1 || present[0] !== gas;
  if (eddy.kind === "none" || !gases.some(hasOthers)) {
    return gases.map((gas) => none(hasOthers(gas) ? "no_eddy_mixing" : "single_gas"));
  }
  const balance = blancBalance(path);
  const crossings = findCrossings(balance, gases.filter(hasOthers), top);
  return gases.map((gas) => (hasOthers(gas) ? lastHomopause(crossings[gas]) : none("single_gas")));
}

type Reason = Extract<HomopauseOutcome, { found: false }>["reason"];

function none(reason: Reason): Homopause {
  return { outcome: { found: false, reason }, otherAltitudes: [] };
}

/** Where D and K of one gas cross, and how it ends. */
interface Crossings {
  found: { altitude: number; isUpward: boolean }[];
  isSeparatedAtTop: boolean;
}

function lastHomopause({ found, isSeparatedAtTop }: Crossings): Homopause {
  if (found.length === 0) return none(isSeparatedAtTop ? "separated_throughout" : "mixed_throughout");
  const chosen = found.findLast((crossing) => crossing.isUpward) ?? found[found.length - 1];
  return {
    outcome: { found: true, altitude: chosen.altitude },
    otherAltitudes: found.filter((crossing) => crossing !== chosen).map((crossing) => crossing.altitude),
  };
}

function findCrossings(balance: BlancBalance, gases: number[], top: number): Crossings[] {
  const { path } = balance;
  const heights = heightsToLookAt(path, top);
  const crossings: Crossings[] = [];
  setBalance(balance, heights[0]);
  for (const gas of gases) crossings[gas] = { found: [], isSeparatedAtTop: logRatio(balance, gas) >= 0 };
  for (let k = 1; k < heights.length; k += 1) {
    const lower = heights[k - 1];
    const length = heights[k] - lower;
    setBalance(balance, heights[k]);
    const passed = gases.filter((gas) => logRatio(balance, gas) >= 0 !== crossings[gas].isSeparatedAtTop);
    for (const gas of passed) {
      const ratioAt = (part: number) => {
        setBalance(balance, part === 1 ? heights[k] : lower + part * length);
        return logRatio(balance, gas);
      };
      const part = rootOf("part of a step up to a homopause", findRoot(ratioAt, 0, 1, rootTolerance));
      const altitude = altitudeOf(path.problem, lower + part * length);
      const isUpward = !crossings[gas].isSeparatedAtTop;
      crossings[gas].found.push({ altitude, isUpward });
      crossings[gas].isSeparatedAtTop = isUpward;
    }
  }
  return crossings;
}

/**
 * Heights between which D − K changes its sign at most once: the ends of the steps. Where T or K are points it
 * may go to and fro within a step, so there the heights are those of the knots and of a fixed number between
 * them, which does not depend on the steps.
 */
function heightsToLookAt({ problem, positions, steps }: ColumnPath, top: number): number[] {
  const { temperature, eddy } = problem;
  const isWithin = (height: number) => height > 0 && height < top;
  const knots = [temperature, eddy]
    .flatMap((along) => (along.kind === "points" ? [...along.heights] : []))
    .filter(isWithin)
    .sort((a, b) => a - b);
  const [first, last] = [knots[0] ?? Infinity, knots[knots.length - 1] ?? -Infinity];
  const ends = [...positions.subarray(0, steps)].filter((height) => height <= first || height >= last);
  const parts = Math.max(1, Math.ceil(samplesAmongKnots / knots.length));
  const between: number[] = [];
  for (let k = 1; k < knots.length; k += 1) {
    for (let part = 1; part < parts; part += 1) {
      between.push(knots[k - 1] + (part * (knots[k] - knots[k - 1])) / parts);
    }
  }
  const heights = [0, ...ends, ...knots, ...between, top].filter((height) => height >= 0 && height <= top);
  return [...new Set(heights)].sort((a, b) => a - b);
}

const samplesAmongKnots = 48;
const rootTolerance = { value: 1e-12, bracket: 4e-16 };

/** What D and K are made of, at the height that was set. */
interface BlancBalance {
  readonly path: ColumnPath;
  /** 1/A and the place of its exponent among `exponents`: every gas by every present gas. */
  readonly inverseCoefficients: Float64Array;
  readonly groups: Int32Array;
  readonly exponents: number[];
  /** T⁻ˢ of each exponent. */
  readonly powers: Float64Array;
  readonly state: Float64Array;
  /** Of the present gases, relative to the most abundant one, and to the one that is so without it. */
  readonly weights: Float64Array;
  readonly weightsWithoutFirst: Float64Array;
  first: number;
  logDensityTimesEddy: number;
}

function blancBalance(path: ColumnPath): BlancBalance {
  const { input, present } = path.problem;
  const size = present.length;
  const inverseCoefficients = new Float64Array(input.gases.length * size);
  const groups = new Int32Array(input.gases.length * size);
  const exponents: number[] = [];
  input.collisionParameters.forEach((row, gas) => {
    present.forEach((other, slot) => {
      if (other === gas) return;
      const { coefficient, exponent } = row[other];
      if (!exponents.includes(exponent)) exponents.push(exponent);
      inverseCoefficients[gas * size + slot] = 1 / coefficient;
      groups[gas * size + slot] = exponents.indexOf(exponent);
    });
  });
  return {
    path,
    inverseCoefficients,
    groups,
    exponents,
    powers: new Float64Array(exponents.length),
    state: new Float64Array(maximumDimension),
    weights: new Float64Array(size),
    weightsWithoutFirst: new Float64Array(size),
    first: 0,
    logDensityTimesEddy: 0,
  };
}

function setBalance(balance: BlancBalance, height: number): void {
  const { path, state, exponents, powers, weights, weightsWithoutFirst } = balance;
  const { problem, positions } = path;
  const step = stepAt(path, height);
  const size = weights.length;
  if (height === positions[step]) nodeState(path, step, state);
  else if (height === positions[step + 1]) nodeState(path, step + 1, state);
  else stateWithin(path, step, height, state);

  const temperature = pathTemperature(path, step, height);
  const logTemperature = logarithm(temperature);
  for (let e = 0; e < exponents.length; e += 1) powers[e] = exponential(-exponents[e] * logTemperature);

  let first = 0;
  for (let i = 1; i < size; i += 1) if (state[i] > state[first]) first = i;
  let second = first === 0 ? 1 : 0;
  for (let i = 0; i < size; i += 1) if (i !== first && state[i] > state[second]) second = i;
  let sum = 0;
  for (let i = 0; i < size; i += 1) {
    weights[i] = exponential(state[i] - state[first]);
    weightsWithoutFirst[i] = size > 1 ? exponential(state[i] - state[second]) : 0;
    sum += weights[i];
  }
  balance.first = first;
  const logDensity = state[first] + logarithm(sum / (boltzmann.value * temperature));
  const { isCapped, eddyPiece } = path.laws[step];
  const eddy = eddyOf(problem.eddy, altitudeOf(problem, height), logDensity, isCapped, eddyPiece);
  balance.logDensityTimesEddy = logDensity + logarithm(eddy);
}

/** ln(D/K) of a gas. */
function logRatio(balance: BlancBalance, gas: number): number {
  const { present } = balance.path.problem;
  const { inverseCoefficients, groups, powers } = balance;
  const weights = present[balance.first] === gas ? balance.weightsWithoutFirst : balance.weights;
  const size = weights.length;
  let sum = 0;
  let resistance = 0;
  for (let slot = 0; slot < size; slot += 1) {
    if (present[slot] === gas) continue;
    sum += weights[slot];
    resistance += weights[slot] * inverseCoefficients[gas * size + slot] * powers[groups[gas * size + slot]];
  }
  return logarithm(sum / resistance) - balance.logDensityTimesEddy;
}
