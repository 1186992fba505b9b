import { gravitationalConstant } from "../constants/codata2022";
import { requirePositive } from "../guards";

/**
 * Gravitational parameter of a mass; the inverse of `massFromGravitationalParameter`.
 *
 *   GM = G M
 *
 * @param mass  M   [kg]      above zero
 * @returns     GM  [m³ s⁻²]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CODATA2022] for G
 * @explained body_gm
 */
export function gravitationalParameterFromMass(mass: number): number {
  requirePositive("mass", mass);
  return gravitationalConstant.value * mass;
}
