import { findGas } from "../handbook/handbookGases";
import { requireNonNegative, requirePositive } from "../guards";

/** ρ, kg m⁻³: water by convention, as in published global equivalent layers. */
export const waterDensity = 1000;

/** m of H2O in the handbook, kg. */
export const waterMass = findGas("H2O")!.mass;

/**
 * Depth of the layer that water molecules would make all around a body; the inverse of `moleculesFromWaterLayer`.
 *
 *   L = N m/(ρ 4πR²),   ρ = 1000 kg/m³
 *
 * @param water.molecules  N  [1]  zero or more; see `waterPerParticle`
 * @param water.radius     R  [m]  above zero
 * @returns                L  [m]
 *
 * @assumes a layer much thinner than the body is wide
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 * @explained water_layer
 */
export function waterLayerFromMolecules({
  molecules,
  radius,
}: {
  molecules: number;
  radius: number;
}): number {
  requireNonNegative("number of water molecules", molecules);
  requirePositive("radius", radius);
  return (molecules * waterMass) / (waterDensity * 4 * Math.PI * radius * radius);
}
