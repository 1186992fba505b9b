import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { temperatureAt } from "../../../../shared/physics/temperature/temperatureAt";
import { temperatureCurve } from "../../../../shared/physics/temperature/temperatureCurve";
import type { TemperatureProfile } from "../../../../shared/physics/types";

const radius = 6356766;
const standard: TemperatureProfile = {
  kind: "bates",
  base: 360,
  exosphere: 1000,
  shape: 0.01875e-3,
  referenceAltitude: 120e3,
};

describe("temperatureAt", () => {
  it("is the 1976 standard's at 150 km, printed as 634.39 K", () => {
    expect(temperatureAt(standard, 150e3, radius)).toBeCloseTo(634.39, 2);
  });

  it("is the curve at that altitude", () => {
    for (const altitude of [110e3, 120e3, 300e3]) {
      expect(temperatureAt(standard, altitude, radius)).toBe(temperatureCurve(standard, radius).at(altitude));
    }
  });

  it("is the base temperature at the reference altitude", () => {
    expect(temperatureAt(standard, 120e3, radius)).toBe(360);
  });

  it("rises with altitude on a Bates profile", () => {
    const altitudes = [120e3, 140e3, 200e3, 400e3];
    const temperatures = altitudes.map((altitude) => temperatureAt(standard, altitude, radius));
    expect(temperatures).toEqual([...temperatures].sort((a, b) => a - b));
  });

  it("refuses an altitude at the centre, and one where a Bates profile has fallen below zero", () => {
    expect(() => temperatureAt(standard, -radius, radius)).toThrow(PhysicsDomainError);
    expect(() => temperatureAt(standard, NaN, radius)).toThrow(PhysicsDomainError);
    expect(() => temperatureAt(standard, 60e3, radius)).toThrow(/temperature at an altitude of 60000 m/);
  });
});
