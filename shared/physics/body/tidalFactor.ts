import { PhysicsDomainError } from "../errors";
import { requirePositive } from "../guards";

/**
 * Share of a body's binding energy that is left to overcome up to the edge of its Hill sphere.
 *
 *   K(ξ) = 1 − 3/(2ξ) + 1/(2ξ³),   ξ = r_H/R_XUV
 *
 * @param place.hillRadius  r_H    [m]  above R_XUV
 * @param place.xuvRadius   R_XUV  [m]  above zero; where the XUV light is absorbed
 * @returns                 K      [1]  between 0 and 1
 *
 * @assumes a body much lighter than its star
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Erkaev2007]
 * @explained tidal_factor
 */
export function tidalFactor({ hillRadius, xuvRadius }: { hillRadius: number; xuvRadius: number }): number {
  requirePositive("Hill radius", hillRadius);
  requirePositive("radius of XUV absorption", xuvRadius);
  if (hillRadius <= xuvRadius) {
    throw new PhysicsDomainError(
      "Hill radius",
      hillRadius,
      `above the radius of XUV absorption, ${xuvRadius} m`,
    );
  }
  const inverse = xuvRadius / hillRadius;
  return (1 - inverse) * (1 - inverse) * (1 + 0.5 * inverse);
}
