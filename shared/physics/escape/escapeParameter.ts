import { boltzmann } from "../constants/codata2022";
import { requirePositive } from "../guards";

/**
 * Gravitational over thermal energy of a particle (the Jeans parameter).
 *
 *   λ = G M m/(k T r) = r/H where g is GM/r²
 *
 * @param place.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param place.particleMass            m   [kg]      above zero; one particle, not one mole
 * @param place.temperature             T   [K]       above zero
 * @param place.radius                  r   [m]       above zero; from the centre
 * @returns                             λ   [1]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 * @explained bulk_escape_parameter, escape_parameter
 */
export function escapeParameter({
  gravitationalParameter,
  particleMass,
  temperature,
  radius,
}: {
  gravitationalParameter: number;
  particleMass: number;
  temperature: number;
  radius: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("particle mass", particleMass);
  requirePositive("temperature", temperature);
  requirePositive("radius", radius);
  return ((gravitationalParameter / radius) * particleMass) / (boltzmann.value * temperature);
}
