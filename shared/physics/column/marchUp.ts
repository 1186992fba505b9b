import { exobaseNumber } from "../exobase/exobaseNumber";
import { findExobaseBand, smallestBoundParameter, type ExobaseBand } from "../exobase/findExobase";
import { addNumber, findLargest, type NumberAlong } from "../exobase/numberAlong";
import { maximumDimension } from "../numerics/dormandPrince";
import { logarithm, power } from "../numerics/elementary";
import { findRoot, rootOf } from "../numerics/findRoot";
import { boundParameter } from "./boundParameter";
import { advance, beginMarch, heightOfMarch, type ColumnMarch } from "./columnMarch";
import { nodeState, stateWithin, type ColumnPath } from "./columnPath";
import { altitudeOf, heightOf, type ColumnProblem } from "./columnProblem";
import { setComposition } from "./composition";
import { largestCentrifugalShare } from "./requireColumnInput";

/** A march from the base to the top, without flux. */
export interface UpwardMarch {
  march: ColumnMarch;
  /** The Knudsen number. */
  along: NumberAlong;
  /** By the bulk criterion. */
  band: ExobaseBand;
  /** Geopotential height of the top, m. */
  top: number;
  /** Whether Kn fell where the escape parameter of the mean mass was below 2. */
  isRunaway: boolean;
  /** Whether the gas became too thin before a given top. */
  isCutShort: boolean;
}

/** Without a given top, it is so many times as high as the exobase, above the base or the body's radius. */
const topOverExobase = 2.3;
/** Without a given top, the march goes on to here first, a little beyond Kn = 10. */
const farEnough = logarithm(10.5);
/** A column without a given top has at least so many scale heights, or twice its base's distance from the centre. */
const smallestExtent = 3;
/** ln of 1e-280 Pa: below it numbers lose their meaning, and a column ends. */
export const smallestLogPressure = logarithm(1e-280);

/** Marches up to the given top, or to where the exobase and its band have been passed. */
export function marchUp(problem: ColumnProblem, tolerance: number): UpwardMarch {
  const { march, along } = setOut(problem, 0, problem.baseLogPressures, tolerance);
  const { top } = problem.input;
  if (top === "auto") return marchToOwnTop(march, along, march.scaleHeight, null);
  return marchToGivenTop(march, along, heightOf(top, problem.input.radius, problem.baseRadius));
}

/**
 * Marches up from an exobase to the given top, or to where `marchUp` would end; a little in any case.
 *
 * @param height           h  [m]  geopotential height of the exobase above the base
 * @param state            ln p of each present gas there  [ln Pa]
 * @param baseScaleHeight  of the whole gas at the base, in h  [m]
 */
export function marchOnFromExobase(
  problem: ColumnProblem,
  height: number,
  state: Float64Array,
  baseScaleHeight: number,
  tolerance: number,
): UpwardMarch {
  const { march, along } = setOut(problem, height, state, tolerance);
  const { top, radius } = problem.input;
  if (top === "auto") return marchToOwnTop(march, along, baseScaleHeight, height);
  const least = Math.min(height + march.scaleHeight / 10, farthestHeight(problem));
  return marchToGivenTop(march, along, Math.max(heightOf(top, radius, problem.baseRadius), least));
}

function setOut(problem: ColumnProblem, height: number, state: Float64Array, tolerance: number) {
  const march = beginMarch({ problem, fluxes: null, height, state, direction: 1, tolerance });
  const number = exobaseNumber(problem, { kind: "bulk" });
  const along: NumberAlong = { path: march.path, number, values: [], slopes: [] };
  addNumber(along, march.law, march.slope);
  return { march, along };
}

function marchToGivenTop(march: ColumnMarch, along: NumberAlong, limit: number): UpwardMarch {
  let isRunaway = false;
  let isThin = false;
  while (heightOfMarch(march) < limit && !isThin) {
    isThin = marchOn(march, along, limit);
    isRunaway ||= runsAway(along);
  }
  const top = isThin ? thinHeight(march.path) : limit;
  return { march, along, band: findExobaseBand(along, along), top, isRunaway, isCutShort: isThin };
}

function marchToOwnTop(
  march: ColumnMarch,
  along: NumberAlong,
  baseScaleHeight: number,
  knownExobase: number | null,
): UpwardMarch {
  const { path } = march;
  const { problem } = path;
  const limit = farthestHeight(problem);
  const extent = Math.min(smallestExtent * baseScaleHeight, problem.baseRadius / 2, limit);
  let isRunaway = false;
  let isThin = false;
  while (heightOfMarch(march) < limit && !isThin) {
    isThin = marchOn(march, along, limit);
    isRunaway = runsAway(along);
    const isFar = along.values[path.steps] >= farEnough;
    if ((isRunaway || isFar) && heightOfMarch(march) >= extent) break;
  }
  const band = findExobaseBand(along, along);
  const wanted = Math.min(
    limit,
    wantedTop(along, { ...band, exobase: knownExobase ?? band.exobase }, extent, isRunaway),
  );
  while (heightOfMarch(march) < wanted && !isThin) isThin = marchOn(march, along, wanted);
  const top = isThin ? Math.min(wanted, thinHeight(path)) : wanted;
  const isBandWhole = band.exobase !== null && band.upper !== null;
  const wholeBand = isBandWhole ? band : findExobaseBand(along, along);
  return { march, along, band: wholeBand, top, isRunaway, isCutShort: false };
}

/**
 * Goes on, beyond the top of a column that set its own, until `isFarEnough`; or until the gas is too thin, runs away
 * or has no height left.
 *
 * @param isFarEnough  asked before the first step and after each
 * @returns            whether the gas runs away
 */
export function marchFurther({ march, along }: UpwardMarch, isFarEnough: () => boolean): boolean {
  const limit = farthestHeight(march.path.problem);
  let isThin = false;
  while (!isThin && heightOfMarch(march) < limit && !isFarEnough()) {
    if (runsAway(along)) return true;
    isThin = marchOn(march, along, limit);
  }
  return false;
}

/** One step; whether the gas is now too thin to go on. */
function marchOn(march: ColumnMarch, along: NumberAlong, limit: number): boolean {
  advance(march, limit);
  return addNumber(along, march.law, march.slope) < smallestLogPressure;
}

/** The top of a column that sets its own; it depends on the gas alone, not on the steps. */
function wantedTop(
  along: NumberAlong,
  { exobase, upper }: ExobaseBand,
  extent: number,
  isRunaway: boolean,
): number {
  const { problem } = along.path;
  const { baseAltitude, radius } = problem.input;
  if (exobase !== null) {
    const altitude = altitudeOf(problem, exobase);
    const reach = Math.max(altitude, altitude - baseAltitude);
    const top = heightOf(altitude + (topOverExobase - 1) * reach, radius, problem.baseRadius);
    return Math.max(extent, top, upper ?? 0);
  }
  const summit = isRunaway ? findLargest(along, heightOfLast(along.path)).height : 0;
  return Math.max(extent, summit, upper ?? 0);
}

/** Whether, where the march stands, Kn falls and the gas is unbound. */
function runsAway({ path, slopes }: NumberAlong): boolean {
  return slopes[path.steps] < 0 && smallestEscapeParameter(path, path.steps) < smallestBoundParameter;
}

/** See `boundParameter`; at a position of a path. */
export function smallestEscapeParameter(path: ColumnPath, node: number): number {
  nodeState(path, node, state);
  setComposition(state, path.problem.masses.length);
  const { temperaturePiece } = path.laws[Math.min(node, path.steps - 1)];
  return boundParameter(path.problem, path.positions[node], temperaturePiece);
}

const state = new Float64Array(maximumDimension);

/** Height within the last step at which the gas becomes too thin. */
function thinHeight(path: ColumnPath): number {
  const step = path.steps - 1;
  const from = path.positions[step];
  const length = path.positions[path.steps] - from;
  const excessAt = (part: number) => {
    stateWithin(path, step, from + part * length, state);
    return setComposition(state, path.problem.masses.length) - smallestLogPressure;
  };
  const found = findRoot(excessAt, 0, 1, { value: 1e-10, bracket: 1e-15 });
  return from + rootOf("part of a step up to the end of the gas", found) * length;
}

function heightOfLast(path: ColumnPath): number {
  return path.positions[path.steps];
}

/** How far up a column without a given top may reach: nearly to infinity, or to where gravity is used up. */
export function farthestHeight({ baseRadius, centrifugalFactor }: ColumnProblem): number {
  if (centrifugalFactor === 0) return baseRadius * (1 - 1e-6);
  const radius = power(largestCentrifugalShare / centrifugalFactor, 1 / 3);
  return Math.min(baseRadius * (1 - 1e-6), baseRadius - (baseRadius * baseRadius) / radius);
}
