import { requireFinite, requirePositive } from "../guards";
import { exponential } from "../numerics/elementary";
import { cubicSlope, cubicValue, monotoneCubic } from "../numerics/monotoneCubic";
import type { TemperatureProfile } from "../types";

/** T(z) made ready for many calls. Altitudes in m above the radius; T in K; dT/dz in K m⁻¹. */
export interface TemperatureCurve {
  at(altitude: number): number;
  slopeAt(altitude: number): number;
}

/**
 * Temperature of a profile as a function of altitude, checked once.
 *
 *   constant   T(z) = T
 *   Bates      T(z) = T∞ − (T∞ − T₀) exp(−s ζ),   ζ = (z − z₀)(R + z₀)/(R + z)
 *   points     monotone cubic (`monotoneCubic`), constant beyond the ends
 *
 * @param profile  T(z)     temperatures above zero [K]; a Bates shape s above zero [m⁻¹]; altitudes finite,
 *                          of points strictly ascending [m]
 * @param radius   R   [m]  above zero; altitudes count from it; a Bates reference altitude z₀ lies above −R
 * @returns        T   [K] and dT/dz [K m⁻¹] at an altitude above −R
 *
 * @assumes a Bates profile is asked above its z₀; below, it falls off exponentially and may pass through zero
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Bates1959], [FritschCarlson1980]
 * @explained level_temperature
 */
export function temperatureCurve(profile: TemperatureProfile, radius: number): TemperatureCurve {
  requirePositive("radius", radius);
  switch (profile.kind) {
    case "constant": {
      const { temperature } = profile;
      requirePositive("temperature", temperature);
      return { at: () => temperature, slopeAt: () => 0 };
    }
    case "bates":
      return batesCurve(profile, radius);
    case "points": {
      for (const temperature of profile.temperatures) requirePositive("temperature", temperature);
      const curve = monotoneCubic(profile.altitudes, profile.temperatures);
      return {
        at: (altitude) => cubicValue(curve, altitude),
        slopeAt: (altitude) => cubicSlope(curve, altitude),
      };
    }
  }
}

function batesCurve(
  { base, exosphere, shape, referenceAltitude }: Extract<TemperatureProfile, { kind: "bates" }>,
  radius: number,
): TemperatureCurve {
  requirePositive("temperature at the base of a Bates profile", base);
  requirePositive("exospheric temperature of a Bates profile", exosphere);
  requirePositive("shape of a Bates profile", shape);
  requireFinite("reference altitude of a Bates profile", referenceAltitude);
  const referenceRadius = radius + referenceAltitude;
  requirePositive("radius at the reference altitude of a Bates profile", referenceRadius);
  const decay = (altitude: number): number =>
    (exosphere - base) *
    exponential((-shape * (altitude - referenceAltitude) * referenceRadius) / (radius + altitude));
  return {
    at: (altitude) => exosphere - decay(altitude),
    slopeAt: (altitude) => {
      const ratio = referenceRadius / (radius + altitude);
      return shape * ratio * ratio * decay(altitude);
    },
  };
}
