import { requireNonNegative, requirePositive } from "../guards";

/**
 * Pressure that particles spread all around a body would add at its surface; the inverse of
 * `particlesFromSurfacePressure`.
 *
 *   Δp = N m g/(4πR²)
 *
 * @param gas.particles     N   [1]      zero or more
 * @param gas.particleMass  m   [kg]     above zero; one particle, not one mole
 * @param gas.gravity       g   [m s⁻²]  above zero; at the surface
 * @param gas.radius        R   [m]      above zero; of the surface
 * @returns                 Δp  [Pa]
 *
 * @assumes an atmosphere much thinner than the body is wide
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 * @explained lost_surface_pressure
 */
export function surfacePressureFromParticles({
  particles,
  particleMass,
  gravity,
  radius,
}: {
  particles: number;
  particleMass: number;
  gravity: number;
  radius: number;
}): number {
  requireNonNegative("number of particles", particles);
  requirePositive("particle mass", particleMass);
  requirePositive("gravity", gravity);
  requirePositive("radius", radius);
  return (particles * particleMass * gravity) / (4 * Math.PI * radius * radius);
}
