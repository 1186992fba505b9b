import { requirePositive } from "../guards";

/**
 * Kinetic energy that a particle needs to leave a body for good.
 *
 *   E = G M m/r
 *
 * @param place.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param place.radius                  r   [m]       above zero; from the centre
 * @param place.particleMass            m   [kg]      above zero; one particle, not one mole
 * @returns                             E   [J]
 *
 * @assumes no collisions on the way, and no star's tide
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 */
export function escapeEnergy({
  gravitationalParameter,
  radius,
  particleMass,
}: {
  gravitationalParameter: number;
  radius: number;
  particleMass: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("radius", radius);
  requirePositive("particle mass", particleMass);
  return (gravitationalParameter / radius) * particleMass;
}
