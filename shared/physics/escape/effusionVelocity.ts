import { requireNonNegative } from "../guards";
import { exponential } from "../numerics/elementary";
import { thermalSpeed } from "./thermalSpeed";

/** A gas at the exobase, but for how much there is of it. */
export interface ExobaseParticle {
  temperature: number;
  particleMass: number;
  escapeParameter: number;
}

/**
 * Jeans flux per particle: how fast a gas would have to rise to supply its thermal escape.
 *
 *   w = v_p (1 + λ) exp(−λ)/(2√π),   v_p = √(2kT/m)
 *
 * @param gas.temperature      T  [K]      above zero
 * @param gas.particleMass     m  [kg]     above zero; one particle, not one mole
 * @param gas.escapeParameter  λ  [1]      zero or more; see `escapeParameter`
 * @returns                    w  [m s⁻¹]  outward positive; 0 where λ is above 745: take `log10EffusionVelocity`
 *
 * @assumes a Maxwellian gas under a sharp, collisionless exobase
 * @valid   `escapeRegimeBounds`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]
 * @explained effusion_velocity
 */
export function effusionVelocity({ temperature, particleMass, escapeParameter }: ExobaseParticle): number {
  requireNonNegative("escape parameter", escapeParameter);
  const speed = thermalSpeed({ temperature, particleMass });
  return (speed * (1 + escapeParameter) * exponential(-escapeParameter)) / (2 * Math.sqrt(Math.PI));
}
