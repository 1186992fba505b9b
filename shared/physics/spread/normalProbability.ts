import { requireFinite } from "../guards";
import { exponential } from "../numerics/elementary";
import { scaledErfc } from "../numerics/scaledErfc";

/**
 * Share of a normal distribution below x standard deviations.
 *
 *   Φ(x) = ½ erfc(−x/√2) = ½ e^{−x²/2} erfcx(−x/√2) for x ≤ 0,   1 − Φ(−x) above
 *
 * @param x  [1]  finite
 * @returns       [1]  from 0 to 1; below x = 0 within (1 + x²/4) 1e-15 relative; 0 below about −38.6
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [DLMF] §7.2, §7.18
 */
export function normalProbability(x: number): number {
  requireFinite("standard deviations from the mean", x);
  const tail = 0.5 * exponential(-0.5 * x * x) * scaledErfc(Math.abs(x) / Math.SQRT2);
  return x <= 0 ? tail : 1 - tail;
}
