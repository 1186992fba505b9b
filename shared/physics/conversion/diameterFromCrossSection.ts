import { requirePositive } from "../guards";

/**
 * Collision diameter of hard spheres; the inverse of `crossSectionFromDiameter`.
 *
 *   d = √(σ/π)
 *
 * @param crossSection  σ  [m²]  above zero
 * @returns             d  [m]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 */
export function diameterFromCrossSection(crossSection: number): number {
  requirePositive("cross section", crossSection);
  return Math.sqrt(crossSection / Math.PI);
}
