import { requirePositive, requireFinite } from "../guards";
import type { TemperatureProfile } from "../types";
import { temperatureCurve } from "./temperatureCurve";

/**
 * Temperature of a profile at one altitude; for many altitudes of one profile take `temperatureCurve`.
 *
 * @param profile   T(z)     see `temperatureCurve`
 * @param altitude  z   [m]  finite, above −R
 * @param radius    R   [m]  above zero
 * @returns         T   [K]  above zero
 *
 * @throws  PhysicsDomainError if an input breaks a bound, or a Bates profile falls to zero below its reference
 *          altitude
 * @source  [Bates1959], [FritschCarlson1980]
 */
export function temperatureAt(profile: TemperatureProfile, altitude: number, radius: number): number {
  const curve = temperatureCurve(profile, radius);
  requireFinite("altitude", altitude);
  requirePositive("distance from the centre", radius + altitude);
  const temperature = curve.at(altitude);
  requirePositive(`temperature at an altitude of ${altitude} m`, temperature);
  return temperature;
}
