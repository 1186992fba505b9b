import { requireNonNegative, requirePositive } from "../guards";

/**
 * Particles that a surface pressure stands for; the inverse of `surfacePressureFromParticles`.
 *
 *   N = 4πR² p/(m g)
 *
 * @param gas.pressure      p  [Pa]     zero or more
 * @param gas.particleMass  m  [kg]     above zero; one particle, not one mole
 * @param gas.gravity       g  [m s⁻²]  above zero; at the surface
 * @param gas.radius        R  [m]      above zero; of the surface
 * @returns                 N  [1]
 *
 * @assumes an atmosphere much thinner than the body is wide
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 */
export function particlesFromSurfacePressure({
  pressure,
  particleMass,
  gravity,
  radius,
}: {
  pressure: number;
  particleMass: number;
  gravity: number;
  radius: number;
}): number {
  requireNonNegative("pressure", pressure);
  requirePositive("particle mass", particleMass);
  requirePositive("gravity", gravity);
  requirePositive("radius", radius);
  return (4 * Math.PI * radius * radius * pressure) / (particleMass * gravity);
}
