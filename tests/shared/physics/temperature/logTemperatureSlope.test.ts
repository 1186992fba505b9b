import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { logTemperatureSlope } from "../../../../shared/physics/temperature/logTemperatureSlope";
import { temperatureAt } from "../../../../shared/physics/temperature/temperatureAt";
import type { TemperatureProfile } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const radius = 3.4e6;
const base = 90e3;

const bates: TemperatureProfile = {
  kind: "bates",
  base: 140,
  exosphere: 260,
  shape: 0.03e-3,
  referenceAltitude: 120e3,
};
const points: TemperatureProfile = {
  kind: "points",
  altitudes: Float64Array.of(80e3, 120e3, 160e3, 250e3),
  temperatures: Float64Array.of(140, 165, 230, 240),
};

/** Altitude of a geopotential height above the base: r = r₀²/(r₀ − h). */
const altitudeOf = (height: number): number => (radius + base) ** 2 / (radius + base - height) - radius;

describe("logTemperatureSlope", () => {
  it.each([
    ["bates", bates],
    ["points", points],
  ])("is d ln T/dh by differences in geopotential height, %s", (_, profile) => {
    for (const height of [40e3, 60e3, 120e3]) {
      const at = (h: number) => Math.log(temperatureAt(profile, altitudeOf(h), radius));
      const slope = logTemperatureSlope(profile, altitudeOf(height), radius, base);
      expect(slope).toBeCloseToRelative((at(height + 5) - at(height - 5)) / 10, 1e-6);
    }
  });

  it("of a Bates profile at its reference is s (T∞ − T₀)/T₀ where h counts from there", () => {
    // Bates (1959): dT/dζ = s (T∞ − T).
    const slope = logTemperatureSlope(bates, 120e3, radius, 120e3);
    expect(slope).toBeCloseToRelative((0.03e-3 * (260 - 140)) / 140, 1e-14);
  });

  it("vanishes where the temperature is constant", () => {
    expect(logTemperatureSlope({ kind: "constant", temperature: 200 }, 2e5, radius, base)).toBe(0);
    expect(logTemperatureSlope(points, 3e5, radius, base)).toBe(0);
  });

  it("is the same for a profile warmer throughout by one factor", () => {
    const factor = fc.double({ min: 0.1, max: 10, noNaN: true });
    const altitude = fc.double({ min: 121e3, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(factor, altitude, (f, z) => {
        const warmer = { ...bates, base: 140 * f, exosphere: 260 * f } as TemperatureProfile;
        const slope = logTemperatureSlope(bates, z, radius, base);
        return Math.abs(logTemperatureSlope(warmer, z, radius, base) - slope) <= 1e-12 * slope + 1e-20;
      }),
      { seed },
    );
  });

  it("refuses places at or below the centre", () => {
    expect(() => logTemperatureSlope(bates, -radius, radius, base)).toThrow(PhysicsDomainError);
    expect(() => logTemperatureSlope(bates, 2e5, radius, -radius)).toThrow(PhysicsDomainError);
    expect(() => logTemperatureSlope(bates, Infinity, radius, base)).toThrow(PhysicsDomainError);
    expect(() => logTemperatureSlope(bates, 0, radius, base)).toThrow(/temperature at an altitude of 0 m/);
  });
});
