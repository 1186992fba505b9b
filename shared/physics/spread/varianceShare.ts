import { PhysicsDomainError } from "../errors";

export interface VarianceShare {
  share: number;
  /** One standard error, from leaving out each group of draws in turn; null for two groups, or where a bin lacks draws. */
  error: number | null;
}

/** The line of one group of draws in one bin: its value at the bin's mean of x, and its slope. */
interface Line {
  value: number;
  slope: number;
}

interface Bin {
  /** Draws of all groups. */
  count: number;
  /** Variance of x within the bin. */
  variance: number;
  /** By group; null where the group has too few draws here. */
  lines: (Line | null)[];
}

const mostBins = 24;

/** A group has about so many draws in a bin, if it has enough for more than one bin. */
const drawsForLine = 16;

/**
 * First-order share of a variance: how much of the variance of y vanishes, on average, once the input x is known
 * (Sobol's first-order index, the square of the correlation ratio).
 *
 *   S = Var(E[y | x]) / Var(y)
 *
 * Estimated from draws as they are. The input is cut into bins of equal probability; in each, every independent group of
 * draws gives a straight line of y. The variance of the lines is taken from products of lines of *different* groups,
 * whose scatter is independent, so that scatter is not taken for an effect:
 *
 *   Var(E[y | x]) = Σ_bins w ⟨(a_r − ȳ)(a_s − ȳ) + b_r b_s Var(x)⟩ over r ≠ s
 *
 * It is not cut off at zero: of an input that does nothing it scatters round zero by its error.
 *
 * @param coordinates  u  [1]  share of the input's distribution below its draw, from 0 to 1
 * @param responses    y       one for each draw; NaN where a draw has no answer and is left out
 * @param groups       draw i belongs to group i mod `groups`, independent of the others; whole, 2 or more
 * @returns            share  [1]; null where y is the same throughout or draws are too few
 *
 * @assumes y is smooth over a bin; bins = N/(16 groups), 1 to 24
 * @throws  PhysicsDomainError if lengths differ or a bound above is broken
 * @source  [Sobol1993] for S; [Plischke2013] for estimates from given draws in bins; lines instead of means, and
 *          products across groups, are ours
 * @explained spread_variance_share
 */
export function varianceShare(
  coordinates: ArrayLike<number>,
  responses: ArrayLike<number>,
  groups: number,
): VarianceShare | null {
  if (coordinates.length !== responses.length) {
    const requirement = `that of responses, ${responses.length}`;
    throw new PhysicsDomainError("number of coordinates", coordinates.length, requirement);
  }
  if (!Number.isInteger(groups) || groups < 2) {
    throw new PhysicsDomainError("groups of draws", groups, "whole and 2 or more");
  }
  const deviations = standardised(responses);
  if (!deviations) return null;
  const count = deviations.reduce((sum, y) => sum + (Number.isNaN(y) ? 0 : 1), 0);
  const binCount = Math.min(mostBins, Math.max(1, Math.floor(count / groups / drawsForLine)));
  const members: number[][] = Array.from({ length: binCount }, () => []);
  let squares = 0;
  deviations.forEach((y, i) => {
    if (Number.isNaN(y)) return;
    squares += y * y;
    members[Math.min(binCount - 1, Math.floor(coordinates[i] * binCount))].push(i);
  });
  const bins = members.map((draws) => binOf(draws, coordinates, deviations, groups));
  const variance = squares / count;
  const share = explained(bins, null);
  if (share === null) return null;
  const without = Array.from({ length: groups }, (_, left) => explained(bins, left));
  const known = without.filter((value) => value !== null);
  const error = known.length === groups ? jackknifeError(known) / variance : null;
  return { share: share / variance, error };
}

/** Deviations from the mean over the largest of them, NaN kept; null where all are the same. */
function standardised(responses: ArrayLike<number>): Float64Array | null {
  let [sum, count] = [0, 0];
  for (let i = 0; i < responses.length; i += 1) {
    if (Number.isNaN(responses[i])) continue;
    sum += responses[i];
    count += 1;
  }
  const mean = sum / count;
  const deviations = Float64Array.from(responses, (response) => response - mean);
  let largest = 0;
  for (const deviation of deviations) if (Math.abs(deviation) > largest) largest = Math.abs(deviation);
  if (!(largest > 0 && Number.isFinite(largest))) return null;
  return deviations.map((deviation) => deviation / largest);
}

function binOf(
  draws: readonly number[],
  coordinates: ArrayLike<number>,
  deviations: Float64Array,
  groups: number,
): Bin {
  const count = draws.length;
  const mean = draws.reduce((sum, i) => sum + coordinates[i] / count, 0);
  const variance =
    draws.reduce((sum, i) => sum + (coordinates[i] - mean) * (coordinates[i] - mean), 0) / count;
  const byGroup: number[][] = Array.from({ length: groups }, () => []);
  for (const i of draws) byGroup[i % groups].push(i);
  const lines = byGroup.map((members) => lineThrough(members, coordinates, deviations, mean));
  return { count, variance, lines };
}

/** Least squares; null where three points do not stand apart. */
function lineThrough(
  members: readonly number[],
  coordinates: ArrayLike<number>,
  deviations: Float64Array,
  centre: number,
): Line | null {
  const count = members.length;
  if (count < 3) return null;
  let [x, y] = [0, 0];
  for (const i of members) {
    x += coordinates[i] / count;
    y += deviations[i] / count;
  }
  let [xx, xy] = [0, 0];
  for (const i of members) {
    xx += (coordinates[i] - x) * (coordinates[i] - x);
    xy += (coordinates[i] - x) * (deviations[i] - y);
  }
  if (!(xx > 0)) return null;
  const slope = xy / xx;
  return { value: y + slope * (centre - x), slope };
}

/** Variance of the lines, of pairs of groups; one group may be left out. */
function explained(bins: readonly Bin[], left: number | null): number | null {
  let [sum, weight] = [0, 0];
  for (const { count, variance, lines } of bins) {
    const taken = lines.filter((line, group) => line !== null && group !== left) as Line[];
    if (taken.length < 2) continue;
    const values = meanOfPairs(taken.map(({ value }) => value));
    const slopes = meanOfPairs(taken.map(({ slope }) => slope));
    sum += count * (values + variance * slopes);
    weight += count;
  }
  return weight > 0 ? sum / weight : null;
}

/** Mean of the products of every two different ones. */
function meanOfPairs(values: readonly number[]): number {
  let [sum, squares] = [0, 0];
  for (const value of values) {
    sum += value;
    squares += value * value;
  }
  return (sum * sum - squares) / (values.length * (values.length - 1));
}

function jackknifeError(values: readonly number[]): number {
  const count = values.length;
  const mean = values.reduce((sum, value) => sum + value, 0) / count;
  const squares = values.reduce((sum, value) => sum + (value - mean) * (value - mean), 0);
  return Math.sqrt(((count - 1) / count) * squares);
}
