import { requirePositive } from "../guards";
import { log10 } from "../numerics/elementary";
import type { ExobaseGas } from "./jeansFlux";
import { log10EffusionVelocity } from "./log10EffusionVelocity";

/**
 * Decimal logarithm of the Jeans flux, which no escape parameter brings to zero.
 *
 *   log₁₀ Φ = log₁₀ n + log₁₀ w
 *
 * @param gas.numberDensity    n        [m⁻³]  above zero
 * @param gas.temperature      T        [K]    above zero
 * @param gas.particleMass     m        [kg]   above zero; one particle, not one mole
 * @param gas.escapeParameter  λ        [1]    zero or more; see `escapeParameter`
 * @returns                    log₁₀ Φ  [Φ in m⁻² s⁻¹, outward positive]
 *
 * @assumes a Maxwellian gas under a sharp, collisionless exobase
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 */
export function log10JeansFlux({ numberDensity, ...particle }: ExobaseGas): number {
  requirePositive("number density", numberDensity);
  return log10(numberDensity) + log10EffusionVelocity(particle);
}
