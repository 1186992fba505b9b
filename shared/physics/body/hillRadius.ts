import { requirePositive } from "../guards";
import { power } from "../numerics/elementary";

/**
 * Radius of the Hill sphere, within which a body holds its own against its star's tide.
 *
 *   r_H = a (M/3M★)^⅓
 *
 * @param orbit.gravitationalParameter      GM   [m³ s⁻²]  above zero; of the body
 * @param orbit.starGravitationalParameter  GM★  [m³ s⁻²]  above zero
 * @param orbit.starDistance                a    [m]       above zero; semi-major axis
 * @returns                                 r_H  [m]
 *
 * @assumes a circular orbit and a body much lighter than its star
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [HamiltonBurns1992], [Erkaev2007]
 * @explained hill_radius
 */
export function hillRadius({
  gravitationalParameter,
  starGravitationalParameter,
  starDistance,
}: {
  gravitationalParameter: number;
  starGravitationalParameter: number;
  starDistance: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("gravitational parameter of the star", starGravitationalParameter);
  requirePositive("distance from the star", starDistance);
  return starDistance * power(gravitationalParameter / (3 * starGravitationalParameter), 1 / 3);
}
