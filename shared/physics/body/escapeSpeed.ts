import { requirePositive } from "../guards";

/**
 * Speed that frees a particle from a body's gravity.
 *
 *   v = √(2GM/r)
 *
 * @param place.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param place.radius                  r   [m]       above zero; from the centre
 * @returns                             v   [m s⁻¹]
 *
 * @assumes the body alone: no star, no rotation
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 * @explained exobase_escape_speed, surface_escape_speed
 */
export function escapeSpeed({
  gravitationalParameter,
  radius,
}: {
  gravitationalParameter: number;
  radius: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("radius", radius);
  return Math.sqrt((2 * gravitationalParameter) / radius);
}
