import { gravitationalConstant } from "../constants/codata2022";
import { requirePositive } from "../guards";

/**
 * Mean density of a spherical body.
 *
 *   ρ = 3GM/(4πG R³)
 *
 * @param body.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param body.radius                  R   [m]       above zero
 * @returns                            ρ   [kg m⁻³]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CODATA2022] for G
 * @explained mean_density
 */
export function meanDensity({
  gravitationalParameter,
  radius,
}: {
  gravitationalParameter: number;
  radius: number;
}): number {
  requirePositive("gravitational parameter", gravitationalParameter);
  requirePositive("radius", radius);
  const surfaceGravity = gravitationalParameter / radius / radius;
  return (3 * surfaceGravity) / (4 * Math.PI * gravitationalConstant.value * radius);
}
