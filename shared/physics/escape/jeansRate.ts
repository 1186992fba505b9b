import { requirePositive } from "../guards";
import { type ExobaseGas, jeansFlux } from "./jeansFlux";

/**
 * Particles that leave the whole exobase by thermal (Jeans) escape in a second.
 *
 *   F = 4πr² Φ
 *
 * @param gas.radius           r  [m]    above zero; of the exobase
 * @param gas.numberDensity    n  [m⁻³]  zero or more
 * @param gas.temperature      T  [K]    above zero
 * @param gas.particleMass     m  [kg]   above zero; one particle, not one mole
 * @param gas.escapeParameter  λ  [1]    zero or more; see `escapeParameter`
 * @returns                    F  [s⁻¹]  outward positive; 0 where the flux is: see `jeansFlux`
 *
 * @assumes the same exobase all around
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 */
export function jeansRate({ radius, ...gas }: ExobaseGas & { radius: number }): number {
  requirePositive("radius", radius);
  return 4 * Math.PI * radius * radius * jeansFlux(gas);
}
