import { type MonotoneCubic, monotoneCubic } from "./monotoneCubic";

/**
 * Monotone piecewise cubic through points, as `monotoneCubic`, but with slopes at both ends that go on with the curve
 * instead of vanishing: for samples cut from a longer profile, such as the logarithm of a density.
 *
 *   end slope: the one-sided three-point difference, no less than 0 and no more than 3 times the outer secant in its
 *   direction, which keeps the curve monotone; the secant itself between two points
 *
 * @param abscissae  x  finite, strictly ascending, at least one
 * @param ordinates  y  finite, as many
 * @returns          the curve; exact for a straight line; see `cubicValue` and `cubicSlope`
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [FritschCarlson1980]
 */
export function freeEndedCubic(abscissae: ArrayLike<number>, ordinates: ArrayLike<number>): MonotoneCubic {
  const curve = monotoneCubic(abscissae, ordinates);
  const last = curve.slopes.length - 1;
  if (last === 0) return curve;
  curve.slopes[0] = endSlope(curve, 0, 1, Math.min(2, last));
  curve.slopes[last] = endSlope(curve, last, last - 1, Math.max(last - 2, 0));
  return curve;
}

/** Slope at an end, from it, its neighbour and the point after (the neighbour again where there are only two). */
function endSlope({ abscissae, ordinates }: MonotoneCubic, end: number, next: number, after: number): number {
  const outerWidth = abscissae[next] - abscissae[end];
  const outer = (ordinates[next] - ordinates[end]) / outerWidth;
  if (after === next) return outer;
  const innerWidth = abscissae[after] - abscissae[next];
  const inner = (ordinates[after] - ordinates[next]) / innerWidth;
  const slope = outer + (outerWidth * (outer - inner)) / (outerWidth + innerWidth);
  if (slope > 0 !== outer > 0) return 0;
  return Math.abs(slope) > 3 * Math.abs(outer) ? 3 * outer : slope;
}
