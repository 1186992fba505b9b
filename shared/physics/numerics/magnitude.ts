import { exponential } from "./elementary";

/**
 * A magnitude from its natural logarithm: null where it is below 1e-300 or above 1e300, so that its logarithm must
 * carry it; 0 for −Infinity.
 */
export function magnitude(logarithmOfIt: number): number | null {
  if (logarithmOfIt === -Infinity) return 0;
  return Math.abs(logarithmOfIt) > 300 * Math.LN10 ? null : exponential(logarithmOfIt);
}
