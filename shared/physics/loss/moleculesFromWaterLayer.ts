import { requireNonNegative, requirePositive } from "../guards";
import { waterDensity, waterMass } from "./waterLayerFromMolecules";

/**
 * Water molecules in a layer all around a body; the inverse of `waterLayerFromMolecules`.
 *
 *   N = ρ 4πR² L/m,   ρ = 1000 kg/m³
 *
 * @param water.depth   L  [m]  zero or more
 * @param water.radius  R  [m]  above zero
 * @returns             N  [1]
 *
 * @assumes a layer much thinner than the body is wide
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 */
export function moleculesFromWaterLayer({ depth, radius }: { depth: number; radius: number }): number {
  requireNonNegative("depth of the layer", depth);
  requirePositive("radius", radius);
  return (waterDensity * 4 * Math.PI * radius * radius * depth) / waterMass;
}
