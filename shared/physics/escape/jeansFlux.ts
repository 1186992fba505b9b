import { requireNonNegative } from "../guards";
import { effusionVelocity, type ExobaseParticle } from "./effusionVelocity";

/** A gas at the exobase. */
export interface ExobaseGas extends ExobaseParticle {
  numberDensity: number;
}

/**
 * Flux of particles that leave the exobase by thermal (Jeans) escape.
 *
 *   Φ = n v_p (1 + λ) exp(−λ)/(2√π),   v_p = √(2kT/m)
 *
 * @param gas.numberDensity    n  [m⁻³]      zero or more
 * @param gas.temperature      T  [K]        above zero
 * @param gas.particleMass     m  [kg]       above zero; one particle, not one mole
 * @param gas.escapeParameter  λ  [1]        zero or more; see `escapeParameter`
 * @returns                    Φ  [m⁻² s⁻¹]  outward positive; 0 where it is below 5e-324: take `log10JeansFlux`
 *
 * @assumes a Maxwellian gas under a sharp, collisionless exobase
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 * @explained jeans_flux
 */
export function jeansFlux({ numberDensity, ...particle }: ExobaseGas): number {
  requireNonNegative("number density", numberDensity);
  return numberDensity * effusionVelocity(particle);
}
