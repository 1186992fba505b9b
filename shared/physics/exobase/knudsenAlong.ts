import { nodeState, stateWithin, type ColumnPath } from "../column/columnPath";
import { setComposition } from "../column/composition";
import { bindColumn, columnSlope } from "../column/columnSlope";
import { maximumDimension } from "../numerics/dormandPrince";
import { findRoot, rootOf } from "../numerics/findRoot";
import { logKnudsen, logKnudsenOfComposition, logKnudsenSlope } from "./knudsen";

/** ln Kn and its slope at the positions of a path. */
export interface KnudsenAlong {
  readonly path: ColumnPath;
  readonly values: number[];
  readonly slopes: number[];
}

/** Where ln Kn passes a value; upward if it rises there. */
export interface KnudsenCrossing {
  height: number;
  isUpward: boolean;
}

/** Looked at this often within a step along which Kn does not only rise. */
const subsamples = 8;
const rootTolerance = { value: 1e-13, bracket: 4e-16 };

/**
 * Adds the position that a march has reached.
 *
 * @param slope  d ln p/dh of each gas there
 * @returns      ln of the pressure there
 */
export function addKnudsen(along: KnudsenAlong, slope: Float64Array): number {
  const { path, values, slopes } = along;
  const node = values.length;
  const height = path.positions[node];
  nodeState(path, node, stateHere);
  const logPressure = setComposition(stateHere, path.problem.masses.length);
  values.push(logKnudsenOfComposition(path.problem, height, logPressure));
  slopes.push(logKnudsenSlope(path.problem, height, slope));
  return logPressure;
}

const stateHere = new Float64Array(maximumDimension);

/** ln Kn at a height within a step. */
export function knudsenWithin({ path }: KnudsenAlong, step: number, height: number): number {
  stateWithin(path, step, height, stateHere);
  return logKnudsen(path.problem, height, stateHere);
}

/** All heights at which ln Kn passes a value, in the order of the path. */
export function findKnudsenCrossings(along: KnudsenAlong, logValue: number): KnudsenCrossing[] {
  const { path, values, slopes } = along;
  const crossings: KnudsenCrossing[] = [];
  for (let step = 0; step < path.steps; step += 1) {
    const from = path.positions[step];
    const length = path.positions[step + 1] - from;
    const onlyRises = slopes[step] > 0 && slopes[step + 1] > 0;
    const parts = onlyRises ? 1 : subsamples;
    let lower = from;
    let valueBelow = values[step];
    for (let part = 1; part <= parts; part += 1) {
      const upper = part === parts ? path.positions[step + 1] : from + (part * length) / parts;
      const value = part === parts ? values[step + 1] : knudsenWithin(along, step, upper);
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
  along: KnudsenAlong,
  step: number,
  lower: number,
  upper: number,
  logValue: number,
): number {
  const length = upper - lower;
  const found = findRoot(
    (part) => knudsenWithin(along, step, lower + part * length) - logValue,
    0,
    1,
    rootTolerance,
  );
  return lower + rootOf("part of a step up to a Knudsen number", found) * length;
}

/** The largest ln Kn between the base and a height, and where. */
export function findLargestKnudsen(along: KnudsenAlong, top: number): { logKnudsen: number; height: number } {
  const { path, values, slopes } = along;
  let largest = { logKnudsen: values[0], height: path.positions[0] };
  const consider = (value: number, height: number) => {
    if (value > largest.logKnudsen) largest = { logKnudsen: value, height };
  };
  for (let step = 0; step < path.steps && path.positions[step] < top; step += 1) {
    if (path.positions[step + 1] > top) consider(knudsenWithin(along, step, top), top);
    else consider(values[step + 1], path.positions[step + 1]);
    if (slopes[step] > 0 && slopes[step + 1] <= 0) {
      const height = summitWithin(along, step);
      if (height <= top) consider(knudsenWithin(along, step, height), height);
    }
  }
  return largest;
}

/** Height within a step at which Kn stops rising. */
function summitWithin({ path }: KnudsenAlong, step: number): number {
  const from = path.positions[step];
  const length = path.positions[step + 1] - from;
  const slopeAt = (part: number) => {
    const height = from + part * length;
    stateWithin(path, step, height, stateHere);
    bindColumn(path.problem, path.fluxes, path.laws[step]);
    columnSlope(height, stateHere, slopeHere);
    setComposition(stateHere, path.problem.masses.length);
    return logKnudsenSlope(path.problem, height, slopeHere);
  };
  const found = findRoot(slopeAt, 0, 1, { value: 0, bracket: 1e-12 });
  return from + rootOf("part of a step up to the largest Knudsen number", found) * length;
}

const slopeHere = new Float64Array(maximumDimension);
