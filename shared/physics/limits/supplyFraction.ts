import { requireFinite, requirePositive } from "../guards";
import { logarithm } from "../numerics/elementary";
import { magnitude } from "../numerics/magnitude";

/**
 * Escape rate of a gas over what diffusion can supply.
 *
 *   F/F_lim,   F_lim = 4πr_c² Φ_lim
 *
 * @param escape.log10Rate       log₁₀ F  [F in s⁻¹]   finite; with its correction factor
 * @param escape.diffusionLimit  Φ_lim    [m⁻² s⁻¹]    above zero; referred to the area of the exobase
 * @param escape.exobaseRadius   r_c      [m]          above zero
 * @returns  the share [1], null where below 1e-300; its decimal logarithm. Near 1 the supply, not the exobase, sets
 *           the rate; above 1 the rate is more than the column can keep up
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Hunten1973]
 * @explained supply_fraction
 */
export function supplyFraction({
  log10Rate,
  diffusionLimit,
  exobaseRadius,
}: {
  log10Rate: number;
  diffusionLimit: number;
  exobaseRadius: number;
}): { share: number | null; log10Share: number } {
  requireFinite("logarithm of the escape rate", log10Rate);
  requirePositive("diffusion limit", diffusionLimit);
  requirePositive("radius of the exobase", exobaseRadius);
  const logLimit = logarithm(diffusionLimit) + logarithm(4 * Math.PI * exobaseRadius * exobaseRadius);
  const logShare = log10Rate * Math.LN10 - logLimit;
  return { share: magnitude(logShare), log10Share: logShare / Math.LN10 };
}
