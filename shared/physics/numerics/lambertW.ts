import { PhysicsDomainError } from "../errors";
import { requireNonNegative } from "../guards";
import { exponential, expm1, logarithm } from "./elementary";

const iterationLimit = 30;
/** Beyond this the equation is linear in the root below zero to the last bit. */
const linearFrom = 37;

/**
 * The root below zero of e^w − w − 1 = c: by the principal branch of the Lambert W function.
 *
 *   w = ln(−W₀(−e^{−1−c}));  by Halley's method
 *
 * @param c  [1]  zero or more
 * @returns  w    [1]  zero or less; within 4e-16 relative
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [Corless1996], [Cranmer2004]
 */
export function principalLambertLogarithm(c: number): number {
  requireNonNegative("excess over the minimum of e^w − w", c);
  const linear = -1 - c;
  if (c > linearFrom) return linear + exponential(linear);
  return refine(c, c < 1 ? -Math.sqrt(2 * c) : linear + exponential(linear));
}

/**
 * The root above zero of e^w − w − 1 = c: by the lower branch of the Lambert W function.
 *
 *   w = ln(−W₋₁(−e^{−1−c}));  by Halley's method
 *
 * @param c  [1]  zero or more
 * @returns  w    [1]  zero or more; within 4e-16 relative
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [Corless1996], [Cranmer2004]
 */
export function lowerLambertLogarithm(c: number): number {
  requireNonNegative("excess over the minimum of e^w − w", c);
  return refine(c, c < 1 ? Math.sqrt(2 * c) : logarithm(1 + c + logarithm(1 + c)));
}

/** Halley's steps until they no longer shorten. */
function refine(c: number, start: number): number {
  if (c === 0) return 0;
  let w = start;
  let stepBefore = Infinity;
  for (let iteration = 0; iteration < iterationLimit; iteration += 1) {
    const value = excess(w) - c;
    const slope = expm1(w);
    const step = value / (slope - (0.5 * value * (1 + slope)) / slope);
    const size = Math.abs(step);
    if (!(size < stepBefore)) return w;
    w -= step;
    if (size <= 1e-16 * Math.abs(w)) return w;
    stepBefore = size;
  }
  throw new PhysicsDomainError(
    "excess over the minimum of e^w − w",
    c,
    "one for which Halley's method settles",
  );
}

/** e^w − w − 1; as a series near 0, where the difference would lose digits. */
function excess(w: number): number {
  if (Math.abs(w) > 0.5) return expm1(w) - w;
  let term = 0.5 * w * w;
  let sum = term;
  for (let k = 3; Math.abs(term) > 1e-17 * sum; k += 1) {
    term *= w / k;
    sum += term;
  }
  return sum;
}
