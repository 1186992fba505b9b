import { gravitationalConstant } from "../constants/codata2022";
import { requirePositive } from "../guards";

/**
 * Mass of a body; the inverse of `gravitationalParameterFromMass`.
 *
 *   M = GM/G
 *
 * @param gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @returns                       M   [kg]      known to 2 parts in 10⁵, as G is
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CODATA2022] for G
 * @explained body_mass
 */
export function massFromGravitationalParameter(gravitationalParameter: number): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  return gravitationalParameter / gravitationalConstant.value;
}
