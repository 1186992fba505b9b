import { bindStep, nodeSlope, nodeState, stateWithin, type ColumnPath } from "../column/columnPath";
import { setComposition } from "../column/composition";
import { columnSlope } from "../column/columnSlope";
import type { StepLaw } from "../column/stepLaw";
import { maximumDimension } from "../numerics/dormandPrince";
import { findRoot, rootOf } from "../numerics/findRoot";
import { logNumber, logNumberOfComposition, logNumberSlope, type ExobaseNumber } from "./exobaseNumber";

/** The logarithm of the number of a criterion, and its slope, at the positions of a path. */
export interface NumberAlong {
  readonly path: ColumnPath;
  readonly number: ExobaseNumber;
  readonly values: number[];
  readonly slopes: number[];
}

/** Where the logarithm of the number passes a value; upward if it rises there. */
export interface NumberCrossing {
  height: number;
  isUpward: boolean;
}

/** Looked at this often within a step along which the number does not only rise. */
const subsamples = 8;
const rootTolerance = { value: 1e-13, bracket: 4e-16 };

/** The number along all of a path that was marched upward, or of what it has so far. */
export function numberAlong(path: ColumnPath, number: ExobaseNumber): NumberAlong {
  const along: NumberAlong = { path, number, values: [], slopes: [] };
  completeNumber(along);
  return along;
}

/** Adds the positions that the path has got since. */
export function completeNumber(along: NumberAlong): void {
  const { path, values } = along;
  while (values.length <= path.steps) {
    const node = values.length;
    nodeSlope(path, node, slopeHere);
    addNumber(along, path.laws[Math.min(node, path.steps - 1)], slopeHere);
  }
}

/**
 * Adds the position that a march has reached.
 *
 * @param law    that holds there
 * @param slope  d ln p/dh of each gas there
 * @returns      ln of the pressure there
 */
export function addNumber(along: NumberAlong, law: StepLaw, slope: Float64Array): number {
  const { path, number, values, slopes } = along;
  const node = values.length;
  const height = path.positions[node];
  nodeState(path, node, stateHere);
  const logPressure = setComposition(stateHere, path.problem.masses.length);
  values.push(logNumberOfComposition(number, height, law, logPressure));
  slopes.push(logNumberSlope(number, height, law, slope));
  return logPressure;
}

const stateHere = new Float64Array(maximumDimension);
const slopeHere = new Float64Array(maximumDimension);

/** The logarithm of the number at a height within a step. */
export function numberWithin({ path, number }: NumberAlong, step: number, height: number): number {
  stateWithin(path, step, height, stateHere);
  return logNumber(number, height, path.laws[step], stateHere);
}

/** All heights at which the logarithm passes a value, in the order of the path. */
export function findCrossings(along: NumberAlong, logValue: number): NumberCrossing[] {
  const { path, values, slopes } = along;
  const crossings: NumberCrossing[] = [];
  for (let step = 0; step < path.steps; step += 1) {
    const from = path.positions[step];
    const length = path.positions[step + 1] - from;
    if (length === 0) continue; // a step that only changed the law
    const onlyRises = slopes[step] > 0 && slopes[step + 1] > 0;
    const parts = onlyRises ? 1 : subsamples;
    let lower = from;
    let valueBelow = values[step];
    for (let part = 1; part <= parts; part += 1) {
      const upper = part === parts ? path.positions[step + 1] : from + (part * length) / parts;
      const value = part === parts ? values[step + 1] : numberWithin(along, step, upper);
      if (valueBelow >= logValue !== value >= logValue) {
        crossings.push({
          height: rootWithin(along, step, lower, upper, logValue),
          isUpward: value >= logValue,
        });
      }
      lower = upper;
      valueBelow = value;
    }
  }
  return crossings;
}

function rootWithin(
  along: NumberAlong,
  step: number,
  lower: number,
  upper: number,
  logValue: number,
): number {
  const length = upper - lower;
  const found = findRoot(
    (part) => numberWithin(along, step, lower + part * length) - logValue,
    0,
    1,
    rootTolerance,
  );
  return lower + rootOf("part of a step up to an exobase", found) * length;
}

/** The largest logarithm between the base and a height, and where. */
export function findLargest(along: NumberAlong, top: number): { logValue: number; height: number } {
  const { path, values, slopes } = along;
  let largest = { logValue: values[0], height: path.positions[0] };
  const consider = (logValue: number, height: number) => {
    if (logValue > largest.logValue) largest = { logValue, height };
  };
  for (let step = 0; step < path.steps && path.positions[step] < top; step += 1) {
    if (path.positions[step + 1] > top) consider(numberWithin(along, step, top), top);
    else consider(values[step + 1], path.positions[step + 1]);
    if (slopes[step] > 0 && slopes[step + 1] <= 0) {
      const height = summitWithin(along, step);
      if (height <= top) consider(numberWithin(along, step, height), height);
    }
  }
  return largest;
}

/** Height within a step at which the number stops rising. */
function summitWithin({ path, number }: NumberAlong, step: number): number {
  const from = path.positions[step];
  const length = path.positions[step + 1] - from;
  const slopeAt = (part: number) => {
    const height = from + part * length;
    stateWithin(path, step, height, stateHere);
    bindStep(path, step);
    columnSlope(height, stateHere, slopeHere);
    setComposition(stateHere, path.problem.masses.length);
    return logNumberSlope(number, height, path.laws[step], slopeHere);
  };
  const found = findRoot(slopeAt, 0, 1, { value: 0, bracket: 1e-12 });
  return from + rootOf("part of a step up to the largest number", found) * length;
}
