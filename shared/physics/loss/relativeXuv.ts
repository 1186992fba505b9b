import { PhysicsDomainError } from "../errors";
import { requireNonNegative, requirePositive } from "../guards";
import { exponential } from "../numerics/elementary";
import { logXuvAt, type XuvHistory, xuvPieces } from "./xuvHistory";

/**
 * XUV light at one age of a star over that at another.
 *
 *   XUV(t)/XUV(t_now);   XUV ∝ t^−β,  and XUV(t) = XUV(t_sat) before the age of saturation;  or by a table
 *
 * @param history  see `XuvHistory`
 * @param age      t      [s]  zero or more; since the star's birth. 0 only where the history begins with a constant
 * @param now      t_now  [s]  above zero
 * @returns               [1]  above zero
 *
 * @assumes the law of the Sun and its like; a star of other mass has another
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Ribas2005]
 * @explained history_rate
 */
export function relativeXuv(history: XuvHistory, age: number, now: number): number {
  requireNonNegative("age", age);
  requirePositive("present age", now);
  const pieces = xuvPieces(history);
  if (age === 0 && pieces[0].exponent !== 0) {
    throw new PhysicsDomainError("age", age, "above zero where there is no age of saturation");
  }
  return exponential(logXuvAt(pieces, age) - logXuvAt(pieces, now));
}
