import { PhysicsDomainError } from "../errors";

/**
 * Quantile of a sample: between the values whose ranks (i − ½)/N lie on either side of p, linearly; beyond the outermost
 * ranks the outermost value.
 *
 * @param sorted       sample, ascending, at least one
 * @param probability  p  [1]  from 0 to 1
 * @returns            in the unit of the sample
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [HyndmanFan1996], definition 5
 * @explained spread_median, spread_lower, spread_upper, spread_q2_5, spread_q97_5
 */
export function sampleQuantile(sorted: ArrayLike<number>, probability: number): number {
  const { length } = sorted;
  if (length === 0) throw new PhysicsDomainError("size of the sample", 0, "one or more");
  if (!(probability >= 0 && probability <= 1)) {
    throw new PhysicsDomainError("probability", probability, "from 0 to 1");
  }
  const place = Math.min(Math.max(length * probability - 0.5, 0), length - 1);
  const below = Math.floor(place);
  const share = place - below;
  if (share === 0) return sorted[below];
  return sorted[below] + share * (sorted[below + 1] - sorted[below]);
}
