import { requireFinite, requirePositive } from "../guards";
import type { TemperatureProfile } from "../types";
import { temperatureCurve } from "./temperatureCurve";

/**
 * Logarithmic temperature gradient in geopotential height above a base, the variable that columns march in.
 *
 *   τ = d ln T/dh = (dT/dz)(r/r₀)²/T,   h = (z − z₀) r₀/r
 *
 * @param profile       T(z)     see `temperatureCurve`
 * @param altitude      z   [m]  finite, above −R
 * @param radius        R   [m]  above zero
 * @param baseAltitude  z₀  [m]  finite, above −R; h counts from it
 * @returns             τ   [m⁻¹]  positive where T rises with altitude
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Bates1959], [FritschCarlson1980]
 */
export function logTemperatureSlope(
  profile: TemperatureProfile,
  altitude: number,
  radius: number,
  baseAltitude: number,
): number {
  const curve = temperatureCurve(profile, radius);
  requireFinite("altitude", altitude);
  requirePositive("distance from the centre", radius + altitude);
  requirePositive("radius at the base", radius + baseAltitude);
  const temperature = curve.at(altitude);
  requirePositive(`temperature at an altitude of ${altitude} m`, temperature);
  const ratio = (radius + altitude) / (radius + baseAltitude);
  return (curve.slopeAt(altitude) * ratio * ratio) / temperature;
}
