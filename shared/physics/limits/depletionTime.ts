import { requireFinite } from "../guards";
import { magnitude } from "../numerics/magnitude";

/**
 * Time in which a gas would leave a column at its present rate.
 *
 *   t = N/F
 *
 * @param gas.logParticles  ln N     [1]         finite; see `columnInventory`
 * @param gas.log10Rate     log₁₀ F  [F in s⁻¹]  finite
 * @returns                 t        [s], null where above 1e300, with its decimal logarithm
 *
 * @assumes nothing is supplied from below meanwhile
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Hunten1973]
 * @explained depletion_time
 */
export function depletionTime({ logParticles, log10Rate }: { logParticles: number; log10Rate: number }): {
  time: number | null;
  log10Time: number;
} {
  requireFinite("logarithm of the number of particles", logParticles);
  requireFinite("logarithm of the escape rate", log10Rate);
  const logTime = logParticles - log10Rate * Math.LN10;
  return { time: magnitude(logTime), log10Time: logTime / Math.LN10 };
}
