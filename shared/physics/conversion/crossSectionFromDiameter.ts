import { requirePositive } from "../guards";

/**
 * Collision cross section of hard spheres; the inverse of `diameterFromCrossSection`.
 *
 *   σ = π d²
 *
 * @param diameter  d  [m]   above zero
 * @returns         σ  [m²]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 */
export function crossSectionFromDiameter(diameter: number): number {
  requirePositive("collision diameter", diameter);
  return Math.PI * diameter * diameter;
}
