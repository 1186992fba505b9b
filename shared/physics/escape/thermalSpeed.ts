import { boltzmann } from "../constants/codata2022";
import { requirePositive } from "../guards";

/**
 * Most probable speed of a Maxwellian gas.
 *
 *   v_p = √(2kT/m)
 *
 * @param gas.temperature   T    [K]      above zero
 * @param gas.particleMass  m    [kg]     above zero; one particle, not one mole
 * @returns                 v_p  [m s⁻¹]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 * @explained thermal_speed
 */
export function thermalSpeed({
  temperature,
  particleMass,
}: {
  temperature: number;
  particleMass: number;
}): number {
  requirePositive("temperature", temperature);
  requirePositive("particle mass", particleMass);
  return Math.sqrt((2 * boltzmann.value * temperature) / particleMass);
}
