import type { ExobaseParticle } from "./effusionVelocity";
import { logEffusionVelocity } from "./logEffusionVelocity";

/**
 * Decimal logarithm of the effusion velocity, which no escape parameter brings to zero.
 *
 *   log₁₀ w = ln w/ln 10
 *
 * @param gas.temperature      T        [K]   above zero
 * @param gas.particleMass     m        [kg]  above zero; one particle, not one mole
 * @param gas.escapeParameter  λ        [1]   zero or more; see `escapeParameter`
 * @returns                    log₁₀ w  [w in m s⁻¹]
 *
 * @assumes a Maxwellian gas under a sharp, collisionless exobase
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 */
export function log10EffusionVelocity(gas: ExobaseParticle): number {
  return logEffusionVelocity(gas) / Math.LN10;
}
