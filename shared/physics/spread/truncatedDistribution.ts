import { PhysicsDomainError } from "../errors";
import { requireFinite, requireNonNegative, requirePositive } from "../guards";
import { exponential, logarithm } from "../numerics/elementary";
import type { Distribution, PhysicalBounds } from "./distribution";
import { normalProbability } from "./normalProbability";
import { normalQuantile } from "./normalQuantile";

/** A distribution within bounds. */
export interface TruncatedDistribution {
  /** Share of the whole distribution that lies outside the bounds. */
  cut: number;
  /** Value below which a share u of what is left lies, 0 < u < 1. */
  quantile(u: number): number;
}

/** Less than this share within the bounds is nothing. */
const smallestShare = 1e-300;

/**
 * A distribution cut off at physical bounds and scaled up to one again.
 *
 *   x(u) = F⁻¹(F(a) + u (F(b) − F(a)))
 *
 * taken from whichever tail is nearer, so that nothing is lost to rounding next to 1. No draw is ever moved to a bound.
 *
 * @param distribution  deviation zero or more; factor above 1, median above zero; lower not above upper
 * @param bounds        lower below upper
 * @returns             the quantile function; null where nothing of the distribution lies within the bounds
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Devroye1986] §II.2
 */
export function truncatedDistribution(
  distribution: Distribution,
  bounds: PhysicalBounds,
): TruncatedDistribution | null {
  if (!(bounds.lower < bounds.upper)) {
    throw new PhysicsDomainError("lower bound", bounds.lower, `below the upper bound, ${bounds.upper}`);
  }
  switch (distribution.form) {
    case "normal":
      return truncatedNormal(distribution.mean, distribution.deviation, bounds);
    case "uniform":
      return truncatedUniform(distribution.lower, distribution.upper, bounds);
    case "log_normal":
      return truncatedLogNormal(distribution.median, distribution.factor, bounds);
  }
}

function truncatedNormal(
  mean: number,
  deviation: number,
  { lower, upper }: PhysicalBounds,
): TruncatedDistribution | null {
  requireFinite("mean", mean);
  requireNonNegative("standard deviation", deviation);
  if (deviation === 0) return mean >= lower && mean <= upper ? { cut: 0, quantile: () => mean } : null;
  const standard = standardNormal((lower - mean) / deviation, (upper - mean) / deviation);
  if (!standard) return null;
  const quantile = (u: number) => within(mean + deviation * standard.quantile(u), lower, upper);
  return { cut: standard.cut, quantile };
}

function truncatedUniform(
  from: number,
  to: number,
  { lower, upper }: PhysicalBounds,
): TruncatedDistribution | null {
  requireFinite("lower end", from);
  requireFinite("upper end", to);
  if (from > to) throw new PhysicsDomainError("lower end", from, `not above the upper end, ${to}`);
  const a = Math.max(from, lower);
  const b = Math.min(to, upper);
  if (a > b || (a === b && from < to)) return null;
  const cut = from === to ? 0 : 1 - (b - a) / (to - from);
  return { cut, quantile: (u) => within(a + u * (b - a), a, b) };
}

function truncatedLogNormal(
  median: number,
  factor: number,
  { lower, upper }: PhysicalBounds,
): TruncatedDistribution | null {
  requirePositive("median", median);
  if (!(factor > 1 && Number.isFinite(factor))) throw new PhysicsDomainError("factor", factor, "above 1");
  if (upper <= 0) return null;
  const deviation = logarithm(factor);
  const standardised = (bound: number) =>
    bound <= 0 ? -Infinity : bound === Infinity ? Infinity : logarithm(bound / median) / deviation;
  const standard = standardNormal(standardised(lower), standardised(upper));
  if (!standard) return null;
  const quantile = (u: number) =>
    within(median * exponential(deviation * standard.quantile(u)), lower, upper);
  return { cut: standard.cut, quantile };
}

/** The standard normal distribution between a and b, which may be infinite. */
function standardNormal(a: number, b: number): TruncatedDistribution | null {
  // Mirrored where both bounds lie above the mean, so that only small tails are subtracted.
  if (a > 0) {
    const mirrored = standardNormal(-b, -a);
    return mirrored && { cut: mirrored.cut, quantile: (u) => -mirrored.quantile(1 - u) };
  }
  const below = shareBelow(a);
  const above = shareBelow(-b);
  const share = b <= 0 ? shareBelow(b) - below : 1 - above - below;
  if (!(share > smallestShare)) return null;
  const quantile = (u: number) => {
    const probability = below + u * share;
    return probability <= 0.5 ? normalQuantile(probability) : -normalQuantile(above + (1 - u) * share);
  };
  return { cut: below + above, quantile };
}

function shareBelow(x: number): number {
  if (x === -Infinity) return 0;
  return x === Infinity ? 1 : normalProbability(x);
}

/** Takes back what rounding of the last digit carried over a bound. */
function within(value: number, lower: number, upper: number): number {
  return Math.min(Math.max(value, lower), upper);
}
