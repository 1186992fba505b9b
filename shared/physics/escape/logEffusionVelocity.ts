import { requireNonNegative } from "../guards";
import { log1p, logarithm } from "../numerics/elementary";
import type { ExobaseParticle } from "./effusionVelocity";
import { thermalSpeed } from "./thermalSpeed";

/**
 * Natural logarithm of the effusion velocity, which no escape parameter brings to zero.
 *
 *   ln w = ln(v_p/2√π) + ln(1 + λ) − λ,   v_p = √(2kT/m)
 *
 * @param gas.temperature      T     [K]   above zero
 * @param gas.particleMass     m     [kg]  above zero; one particle, not one mole
 * @param gas.escapeParameter  λ     [1]   zero or more; see `escapeParameter`
 * @returns                    ln w  [w in m s⁻¹]
 *
 * @assumes a Maxwellian gas under a sharp, collisionless exobase
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 */
export function logEffusionVelocity({ temperature, particleMass, escapeParameter }: ExobaseParticle): number {
  requireNonNegative("escape parameter", escapeParameter);
  const speed = thermalSpeed({ temperature, particleMass });
  return logarithm(speed / (2 * Math.sqrt(Math.PI))) + (log1p(escapeParameter) - escapeParameter);
}
