import { PhysicsDomainError } from "../errors";
import { requireAscending, requireFinite } from "../guards";

/** A curve through points that never overshoots them; constant beyond its ends. */
export interface MonotoneCubic {
  abscissae: Float64Array;
  ordinates: Float64Array;
  /** dy/dx at each point. */
  slopes: Float64Array;
}

/**
 * Monotone piecewise cubic through points, with slopes of zero at both ends.
 *
 *   inner slopes: the three-point difference, 0 where the secants on both sides differ in sign or vanish;
 *   then scaled into α² + β² ≤ 9, α and β the slopes at the ends of an interval over its secant
 *
 * @param abscissae  x  finite, strictly ascending, at least one
 * @param ordinates  y  finite, as many
 * @returns          the curve; see `cubicValue` and `cubicSlope`
 *
 * @assumes rounding may carry a value past the range of its two points by some 1e-16 of their difference
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [FritschCarlson1980]
 */
export function monotoneCubic(abscissae: ArrayLike<number>, ordinates: ArrayLike<number>): MonotoneCubic {
  const count = abscissae.length;
  if (count < 1) throw new PhysicsDomainError("number of points", count, "one or more");
  if (ordinates.length !== count) {
    throw new PhysicsDomainError("number of values", ordinates.length, `the number of points, ${count}`);
  }
  requireAscending("point of a curve", abscissae);
  for (let i = 0; i < count; i += 1) requireFinite("value of a curve", ordinates[i]);

  const x = Float64Array.from(abscissae);
  const y = Float64Array.from(ordinates);
  const slopes = new Float64Array(count);
  for (let i = 1; i < count - 1; i += 1) {
    const before = x[i] - x[i - 1];
    const after = x[i + 1] - x[i];
    const secantBefore = (y[i] - y[i - 1]) / before;
    const secantAfter = (y[i + 1] - y[i]) / after;
    const isTurning = !((secantBefore > 0 && secantAfter > 0) || (secantBefore < 0 && secantAfter < 0));
    slopes[i] = isTurning ? 0 : (after * secantBefore + before * secantAfter) / (before + after);
  }
  for (let i = 0; i < count - 1; i += 1) {
    const secant = (y[i + 1] - y[i]) / (x[i + 1] - x[i]);
    if (secant === 0) continue;
    const alpha = slopes[i] / secant;
    const beta = slopes[i + 1] / secant;
    const square = alpha * alpha + beta * beta;
    if (square <= 9) continue;
    const scale = 3 / Math.sqrt(square);
    slopes[i] = scale * alpha * secant;
    slopes[i + 1] = scale * beta * secant;
  }
  return { abscissae: x, ordinates: y, slopes };
}

/** y at x; the first or last ordinate beyond the ends. */
export function cubicValue(curve: MonotoneCubic, x: number): number {
  const { abscissae, ordinates, slopes } = curve;
  const last = abscissae.length - 1;
  if (x <= abscissae[0]) return ordinates[0];
  if (x >= abscissae[last]) return ordinates[last];
  const i = intervalOf(abscissae, x);
  const width = abscissae[i + 1] - abscissae[i];
  const t = (x - abscissae[i]) / width;
  const u = 1 - t;
  const rise = ordinates[i + 1] - ordinates[i];
  const bend = u * t * width * (u * slopes[i] - t * slopes[i + 1]);
  return ordinates[i] + rise * t * t * (3 - 2 * t) + bend;
}

/** dy/dx at x; 0 beyond the ends. */
export function cubicSlope(curve: MonotoneCubic, x: number): number {
  const { abscissae, ordinates, slopes } = curve;
  const last = abscissae.length - 1;
  if (x <= abscissae[0] || x >= abscissae[last]) return 0;
  const i = intervalOf(abscissae, x);
  const width = abscissae[i + 1] - abscissae[i];
  const t = (x - abscissae[i]) / width;
  const u = 1 - t;
  const secant = (ordinates[i + 1] - ordinates[i]) / width;
  return 6 * u * t * secant + u * (u - 2 * t) * slopes[i] + t * (t - 2 * u) * slopes[i + 1];
}

/** The i with xᵢ ≤ x < xᵢ₊₁, for x between the ends. */
function intervalOf(abscissae: Float64Array, x: number): number {
  let low = 0;
  let high = abscissae.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (abscissae[middle] <= x) low = middle;
    else high = middle;
  }
  return low;
}
