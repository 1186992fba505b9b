import { PhysicsDomainError } from "../errors";
import { requireNonNegative } from "../guards";
import { power } from "../numerics/elementary";
import { equivalentTime, type LossSpan } from "./equivalentTime";
import { relativeXuv } from "./relativeXuv";

export interface LossHistory {
  /** s, ascending from `begin` to `end`. */
  ages: Float64Array;
  /** s⁻¹ */
  rates: Float64Array;
  /** Particles gone since `begin`. */
  lost: Float64Array;
}

/**
 * Escape rate and what has been lost, against the star's age, between two ages.
 *
 *   F(t) = F_now (XUV(t)/XUV(t_now))^x;   N(t) = ∫ F dt since `begin`
 *
 * @param loss.rate   F_now  [s⁻¹]  zero or more; at age `now`
 * @param loss        the rest: see `equivalentTime`; `end` above `begin`
 * @param points      so many ages, two or more, in equal ratios; in equal steps from age 0
 * @returns           ages [s], rates [s⁻¹] and particles [1]; the last of `lost` is the loss in all
 *
 * @assumes as `equivalentTime`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Ribas2005]
 * @explained history_lost
 */
export function lossHistory({ rate, ...span }: LossSpan & { rate: number }, points: number): LossHistory {
  requireNonNegative("present rate", rate);
  const { begin, end, now, history, exponent } = span;
  if (!(points >= 2 && Number.isInteger(points))) {
    throw new PhysicsDomainError("number of points", points, "a whole number, two or more");
  }
  if (!(end > begin)) throw new PhysicsDomainError("age at the end", end, `above ${begin} s`);
  const ages = new Float64Array(points);
  const rates = new Float64Array(points);
  const lost = new Float64Array(points);
  for (let i = 0; i < points; i += 1) {
    const share = i / (points - 1);
    ages[i] = share === 1 ? end : begin === 0 ? end * share : begin * power(end / begin, share);
    rates[i] = rate * power(relativeXuv(history, ages[i], now), exponent);
    if (i > 0) lost[i] = lost[i - 1] + rate * equivalentTime({ ...span, begin: ages[i - 1], end: ages[i] });
  }
  return { ages, rates, lost };
}
