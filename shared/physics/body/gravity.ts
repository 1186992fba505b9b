import { requirePositive } from "../guards";

/**
 * Acceleration of gravity of a spherical body, rotation left out.
 *
 *   g = GM/r²
 *
 * @param place.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param place.radius                  r   [m]       above zero; from the centre
 * @returns                             g   [m s⁻²]   inward, as a positive number
 *
 * @assumes all mass inside r
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 * @explained surface_gravity
 */
export function gravity({
  gravitationalParameter,
  radius,
}: {
  gravitationalParameter: number;
  radius: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("radius", radius);
  return gravitationalParameter / radius / radius;
}
