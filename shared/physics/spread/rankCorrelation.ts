import { PhysicsDomainError } from "../errors";

/**
 * Spearman's rank correlation: that of the ranks of two samples, equal values sharing the mean of their ranks.
 *
 * @param one    first sample
 * @param other  second sample, of the same length
 * @returns      from −1 to 1; null where one of them is the same throughout, or has fewer than two values
 *
 * @throws  PhysicsDomainError if the lengths differ
 * @source  [Spearman1904]
 * @explained spread_rank_correlation
 */
export function rankCorrelation(one: ArrayLike<number>, other: ArrayLike<number>): number | null {
  if (one.length !== other.length) {
    throw new PhysicsDomainError(
      "length of the second sample",
      other.length,
      `that of the first, ${one.length}`,
    );
  }
  return correlation(ranks(one), ranks(other));
}

/** Ranks from 1, ties sharing their mean. */
export function ranks(values: ArrayLike<number>): Float64Array {
  const sorted = Float64Array.from(values).sort();
  return Float64Array.from(values, (value) => {
    const first = firstAtOrAbove(sorted, value);
    let last = first;
    if (sorted[first + 1] === value) last = firstAbove(sorted, value) - 1;
    return (first + last) / 2 + 1;
  });
}

function firstAtOrAbove(sorted: Float64Array, value: number): number {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (sorted[middle] < value) low = middle + 1;
    else high = middle;
  }
  return low;
}

function firstAbove(sorted: Float64Array, value: number): number {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (sorted[middle] <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}

function correlation(x: Float64Array, y: Float64Array): number | null {
  const { length } = x;
  if (length < 2) return null;
  const mean = (length + 1) / 2;
  let [xx, yy, xy] = [0, 0, 0];
  for (let i = 0; i < length; i += 1) {
    const [a, b] = [x[i] - mean, y[i] - mean];
    xx += a * a;
    yy += b * b;
    xy += a * b;
  }
  return xx === 0 || yy === 0 ? null : xy / Math.sqrt(xx * yy);
}
