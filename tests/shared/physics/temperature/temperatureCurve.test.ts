import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { temperatureCurve } from "../../../../shared/physics/temperature/temperatureCurve";
import type { TemperatureProfile } from "../../../../shared/physics/types";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const radius = 6356766;

const standard: TemperatureProfile = {
  kind: "bates",
  base: 360,
  exosphere: 1000,
  shape: 0.01875e-3,
  referenceAltitude: 120e3,
};

const points: TemperatureProfile = {
  kind: "points",
  altitudes: Float64Array.of(80e3, 120e3, 160e3, 250e3),
  temperatures: Float64Array.of(140, 165, 230, 240),
};

describe("temperatureCurve", () => {
  it.each([
    // Altitude in km, T in K, printed to 0.01 K.
    [120, 360.0],
    [150, 634.39],
    [200, 854.56],
    [300, 976.01],
    [500, 999.24],
  ])("of the 1976 standard at %s km is %s K", (altitudeKm, printed) => {
    expect(temperatureCurve(standard, radius).at(altitudeKm * 1e3)).toAgreeWith({
      what: "Bates temperature of the 1976 standard, 120 to 500 km",
      unit: "K",
      published: printed,
      within: { absolute: 0.01 },
      source: "USSA1976",
      mark: "published",
    });
  });

  it("of Bates solves dT/dζ = s (T∞ − T), stepped through in geopotential height", () => {
    // Classical Runge-Kutta from the base, 4000 steps.
    const [end, steps] = [250e3, 4000];
    const reach = ((end - 120e3) * (radius + 120e3)) / (radius + end);
    const step = reach / steps;
    const slope = (t: number) => 0.01875e-3 * (1000 - t);
    let t = 360;
    for (let i = 0; i < steps; i += 1) {
      const a = slope(t);
      const b = slope(t + (step * a) / 2);
      const c = slope(t + (step * b) / 2);
      const d = slope(t + step * c);
      t += (step * (a + 2 * b + 2 * c + d)) / 6;
    }
    expect(temperatureCurve(standard, radius).at(end)).toBeCloseToRelative(t, 1e-11);
  });

  it("of Bates tends to the exospheric temperature", () => {
    expect(temperatureCurve(standard, radius).at(5e6)).toBeCloseToRelative(1000, 1e-10);
    expect(temperatureCurve({ ...standard, base: 1000 }, radius).at(300e3)).toBe(1000);
  });

  it("through points is flat beyond them", () => {
    const curve = temperatureCurve(points, radius);
    expect([curve.at(0), curve.at(120e3), curve.at(1e6)]).toEqual([140, 165, 240]);
    expect([curve.slopeAt(0), curve.slopeAt(1e6)]).toEqual([0, 0]);
  });

  it("of a constant is that constant", () => {
    const curve = temperatureCurve({ kind: "constant", temperature: 200 }, radius);
    expect([curve.at(-1e3), curve.at(5e8), curve.slopeAt(1e5)]).toEqual([200, 200, 0]);
  });

  it("has the slope of its value", () => {
    for (const profile of [standard, points]) {
      const curve = temperatureCurve(profile, radius);
      for (const altitude of [125e3, 150e3, 170e3, 245e3]) {
        const difference = (curve.at(altitude + 1) - curve.at(altitude - 1)) / 2;
        expect(curve.slopeAt(altitude)).toBeCloseToRelative(difference, 1e-6);
      }
    }
  });

  it("of Bates rises with altitude and stays between its two temperatures", () => {
    const temperature = fc.double({ min: 20, max: 3000, noNaN: true });
    const altitude = fc.double({ min: 120e3, max: 5e6, noNaN: true });
    fc.assert(
      fc.property(temperature, temperature, altitude, altitude, (a, b, c, d) => {
        const [base, exosphere] = a < b ? [a, b] : [b, a];
        const [low, high] = c < d ? [c, d] : [d, c];
        const curve = temperatureCurve({ ...standard, base, exosphere } as TemperatureProfile, radius);
        const [cool, warm] = [curve.at(low), curve.at(high)];
        return (
          cool >= base - 2.3e-16 * exosphere &&
          warm <= exosphere &&
          cool <= warm + 1e-12 &&
          curve.slopeAt(low) >= 0
        );
      }),
      { seed },
    );
  });

  it.each<[string, TemperatureProfile]>([
    ["a temperature of zero", { kind: "constant", temperature: 0 }],
    ["a base below zero", { ...standard, base: -1 } as TemperatureProfile],
    ["an endless exosphere", { ...standard, exosphere: Infinity } as TemperatureProfile],
    ["a shape of zero", { ...standard, shape: 0 } as TemperatureProfile],
    ["a reference at the centre", { ...standard, referenceAltitude: -radius } as TemperatureProfile],
    [
      "a point at zero kelvin",
      { ...points, temperatures: Float64Array.of(140, 0, 230, 240) } as TemperatureProfile,
    ],
    [
      "points out of order",
      { ...points, altitudes: Float64Array.of(80e3, 70e3, 160e3, 250e3) } as TemperatureProfile,
    ],
  ])("refuses %s", (_, profile) => {
    expect(() => temperatureCurve(profile, radius)).toThrow(PhysicsDomainError);
  });

  it("refuses a radius of zero", () => {
    expect(() => temperatureCurve(standard, 0)).toThrow(PhysicsDomainError);
  });
});
