import { PhysicsDomainError } from "../errors";
import { logarithm, powerOfTen } from "../numerics/elementary";
import { sampleQuantile } from "./sampleQuantile";

/** One bin of a histogram: from `from` up to, not including, `to`; the last includes it. */
export interface HistogramBin {
  from: number;
  to: number;
  count: number;
}

const fewestBins = 8;
const mostBins = 64;

/**
 * Equal bins from the smallest to the largest value of a sample, their width after Freedman and Diaconis,
 * 2 (q₇₅ − q₂₅) N^(−1/3), but 8 bins at least and 64 at most. A sample that is the same throughout gets one bin.
 *
 * @param sorted  sample, ascending, finite, at least one
 * @returns       bins without a gap, ascending
 *
 * @throws  PhysicsDomainError if the input breaks a bound above
 * @source  [FreedmanDiaconis1981]
 */
export function histogram(sorted: ArrayLike<number>): HistogramBin[] {
  const { length } = sorted;
  if (length === 0) throw new PhysicsDomainError("size of the sample", 0, "one or more");
  const [first, last] = [sorted[0], sorted[length - 1]];
  if (!(first < last)) return [{ from: first, to: last, count: length }];

  const quartiles = sampleQuantile(sorted, 0.75) - sampleQuantile(sorted, 0.25);
  const cubeRoot = powerOfTen(logarithm(length) / (3 * Math.LN10));
  const wanted = quartiles > 0 ? Math.ceil(((last - first) * cubeRoot) / (2 * quartiles)) : mostBins;
  const count = Math.min(mostBins, Math.max(fewestBins, wanted));
  const edge = (k: number) => (k === count ? last : first + ((last - first) * k) / count);
  const bins: HistogramBin[] = [];
  let at = 0;
  for (let k = 0; k < count; k += 1) {
    const [from, to] = [edge(k), edge(k + 1)];
    const begun = at;
    while (at < length && (sorted[at] < to || k === count - 1)) at += 1;
    bins.push({ from, to, count: at - begun });
  }
  return bins;
}
