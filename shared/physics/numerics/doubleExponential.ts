import { requirePositive } from "../guards";
import { exponential } from "./elementary";

/** Step of the trapezoidal rule, and how many to either side of the middle until nothing is left to add. */
const step = 0.1;
const places = 39;
const placesBetweenEnds = 33;

/** e^{(π/2) sinh t} at t = k step, k = 0 … places, and its logarithm's slope (π/2) cosh t. */
const stretches = new Float64Array(places + 1);
const slopes = new Float64Array(places + 1);
for (let k = 0; k <= places; k += 1) {
  const rise = exponential(k * step);
  stretches[k] = exponential((Math.PI / 4) * (rise - 1 / rise));
  slopes[k] = (Math.PI / 4) * (rise + 1 / rise);
}

/**
 * Integral over the half line by the trapezoidal rule after a double exponential change of variable.
 *
 *   ∫₀^∞ f dx,   x = L e^{(π/2) sinh t},  steps of 0.1 in t
 *
 * @param f      the integrand; may be singular at 0 as long as it can be integrated; called at 79 places from
 *               1e-17 L to 7e16 L
 * @param scale  L  above zero; where most of the integral has come together
 * @returns      the integral; within about 1e-12 for what is smooth and falls off from L on as a power or faster
 *
 * @throws  PhysicsDomainError if the scale is not above zero
 * @source  [TakahasiMori1974]
 */
export function integrateHalfLine(f: (x: number) => number, scale: number): number {
  requirePositive("scale of an integral", scale);
  let sum = scale * slopes[0] * f(scale);
  for (let k = 1; k <= places; k += 1) {
    const far = scale * stretches[k];
    const near = scale / stretches[k];
    sum += slopes[k] * (near * f(near) + far * f(far));
  }
  return step * sum;
}

/**
 * Integral between two ends by the trapezoidal rule after a double exponential change of variable.
 *
 *   ∫₀^b f dx,   x = b/(1 + e^{−π sinh t}),  steps of 0.1 in t
 *
 * @param f   the integrand; bounded, its slopes may be infinite at the ends; called at 67 places
 * @param to  b  above zero
 * @returns   the integral; within about 1e-12 for what is smooth between the ends
 *
 * @throws  PhysicsDomainError if the end is not finite and above zero
 * @source  [TakahasiMori1974]
 */
export function integrateFromZero(f: (x: number) => number, to: number): number {
  requirePositive("end of an integral", to);
  let sum = 0.5 * to * slopes[0] * f(0.5 * to);
  for (let k = 1; k <= placesBetweenEnds; k += 1) {
    const square = stretches[k] * stretches[k];
    const near = to / (1 + square);
    const share = square / (1 + square);
    sum += slopes[k] * 2 * near * share * (f(near) + f(to * share));
  }
  return step * sum;
}
