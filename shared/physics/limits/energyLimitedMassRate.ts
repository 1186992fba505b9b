import { PhysicsDomainError } from "../errors";
import { requireFraction, requireNonNegative, requirePositive } from "../guards";

export interface HeatedBody {
  heatingEfficiency: number;
  xuvFlux: number;
  xuvRadius: number;
  radius: number;
  gravitationalParameter: number;
  tidalFactor: number;
}

/**
 * Mass rate that absorbed XUV light could lift off a body, if a given share of it went into lifting.
 *
 *   Ṁ = ε π R_XUV² R F_XUV/(G M K)
 *
 * @param body.heatingEfficiency       ε      [1]        0 to 1
 * @param body.xuvFlux                 F_XUV  [W m⁻²]    zero or more; at the body, before spreading over the sphere
 * @param body.xuvRadius               R_XUV  [m]        above zero; where the light is absorbed
 * @param body.radius                  R      [m]        above zero; where the gas is lifted from
 * @param body.gravitationalParameter  GM     [m³ s⁻²]   above zero
 * @param body.tidalFactor             K      [1]        above 0, up to 1; see `tidalFactor`, 1 without a star
 * @returns                            Ṁ      [kg s⁻¹]   outward positive
 *
 * @assumes all the energy spent is spent on lifting the gas to the edge of the Hill sphere
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Watson1981], [Erkaev2007]
 * @explained energy_limited_mass_rate
 */
export function energyLimitedMassRate(body: HeatedBody): number {
  const { heatingEfficiency, xuvFlux, xuvRadius, radius, gravitationalParameter, tidalFactor } = body;
  requireFraction("heating efficiency", heatingEfficiency);
  requireNonNegative("XUV flux", xuvFlux);
  requirePositive("radius of XUV absorption", xuvRadius);
  requirePositive("radius", radius);
  requirePositive("gravitational parameter", gravitationalParameter);
  if (!(tidalFactor > 0 && tidalFactor <= 1)) {
    throw new PhysicsDomainError("tidal factor", tidalFactor, "above 0 and no more than 1");
  }
  const power = heatingEfficiency * Math.PI * xuvRadius * xuvRadius * xuvFlux;
  return power / ((gravitationalParameter / radius) * tidalFactor);
}
