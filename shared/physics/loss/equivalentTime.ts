import { PhysicsDomainError } from "../errors";
import { requireFinite, requireNonNegative, requirePositive } from "../guards";
import { exponential, expm1, logarithm } from "../numerics/elementary";
import { logXuvAt, logXuvWithin, type XuvHistory, type XuvPiece, xuvPieces } from "./xuvHistory";

export interface LossSpan {
  history: XuvHistory;
  exponent: number;
  begin: number;
  end: number;
  now: number;
}

/**
 * Time in which the present escape rate would lose what was lost between two ages, with a rate that went with the
 * star's XUV light.
 *
 *   τ = ∫ (XUV(t)/XUV(t_now))^x dt from t_begin to t_end;  N = F_now τ
 *   over a piece XUV ∝ t^−β:  ∫ t^−p dt = t₁^{1−p} expm1[(1−p) ln(t₂/t₁)]/(1−p),  p = βx;  ln(t₂/t₁) where p = 1
 *
 * @param span.history   see `XuvHistory`
 * @param span.exponent  x        [1]  any; 1 where the rate goes with the light, 0 where it never changed
 * @param span.begin     t_begin  [s]  zero or more; age of the star
 * @param span.end       t_end    [s]  `begin` or more
 * @param span.now       t_now    [s]  above zero; age at which the rate is the present one
 * @returns              τ        [s]  zero or more
 *
 * @assumes a rate that depends on the star's light alone, by one power throughout
 * @throws  PhysicsDomainError if an input breaks a bound above, or if the loss from age 0 on has no end (βx ≥ 1 and no
 *          saturation)
 * @source  [Ribas2005]
 * @explained lost_particles, lost_mass
 */
export function equivalentTime({ history, exponent, begin, end, now }: LossSpan): number {
  requireFinite("exponent of the rate with XUV", exponent);
  requireNonNegative("age at the beginning", begin);
  if (!(end >= begin && end < Infinity)) {
    throw new PhysicsDomainError(
      "age at the end",
      end,
      `finite and the age at the beginning, ${begin} s, or more`,
    );
  }
  requirePositive("present age", now);
  const pieces = xuvPieces(history);
  const logNow = logXuvAt(pieces, now);
  let sum = 0;
  for (const piece of pieces) {
    const from = Math.max(begin, piece.from);
    const to = Math.min(end, piece.to);
    if (to > from) sum += integratePiece(piece, exponent, from, to, logNow);
  }
  return sum;
}

/** ∫ (XUV/XUV_now)^x dt inside one piece. */
function integratePiece(piece: XuvPiece, x: number, from: number, to: number, logNow: number): number {
  const p = piece.exponent * x;
  if (p === 0) return exponential(x * (piece.logFlux - logNow)) * (to - from);
  const rest = 1 - p;
  if (from === 0) {
    if (rest <= 0) {
      const requirement = "above zero, or an age of saturation given: the loss from age 0 on has no end";
      throw new PhysicsDomainError("age at the beginning", 0, requirement);
    }
    return (exponential(x * (logXuvWithin(piece, to) - logNow)) * to) / rest;
  }
  const stretch = logarithm(to / from);
  const length = rest === 0 ? stretch : expm1(rest * stretch) / rest;
  return exponential(x * (logXuvWithin(piece, from) - logNow)) * from * length;
}
