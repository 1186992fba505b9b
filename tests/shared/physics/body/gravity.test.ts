import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { gravity } from "../../../../shared/physics/body/gravity";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const standardRadius = 6356766;
const standardEarth = 9.80665 * standardRadius ** 2;

describe("gravity", () => {
  it.each([
    // Altitude in km, g in m/s², to the digits printed.
    [86, 9.5466],
    [120, 9.4466],
    [150, 9.3597],
    [300, 8.9427],
    [500, 8.4286],
    [1000, 7.3218],
  ])("at %s km is that of the 1976 standard", (altitudeKm, printed) => {
    const radius = standardRadius + altitudeKm * 1e3;
    expect(gravity({ gravitationalParameter: standardEarth, radius })).toAgreeWith({
      what: "gravity of the 1976 standard, 86 to 1000 km",
      unit: "m s⁻²",
      published: printed,
      within: { relative: 1e-5 },
      source: "USSA1976",
      mark: "published",
    });
  });

  it("is the slope of the potential −GM/r", () => {
    const [gm, r, step] = [4e14, 7e6, 10];
    const slope = (gm / (r - step) - gm / (r + step)) / (2 * step);
    expect(gravity({ gravitationalParameter: gm, radius: r })).toBeCloseToRelative(slope, 1e-9);
  });

  it("vanishes far away", () => {
    expect(gravity({ gravitationalParameter: standardEarth, radius: 1e20 })).toBeLessThan(1e-24);
  });

  it("falls with the square of the distance and rises with the mass", () => {
    const size = fc.double({ min: 1e4, max: 1e9, noNaN: true });
    const mass = fc.double({ min: 1e8, max: 1e18, noNaN: true });
    fc.assert(
      fc.property(mass, size, (gravitationalParameter, radius) => {
        const here = gravity({ gravitationalParameter, radius });
        const farther = gravity({ gravitationalParameter, radius: 2 * radius });
        const heavier = gravity({ gravitationalParameter: 2 * gravitationalParameter, radius });
        return farther === here / 4 && heavier === here * 2;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => gravity({ gravitationalParameter: wrong, radius: 1 })).toThrow(PhysicsDomainError);
    expect(() => gravity({ gravitationalParameter: 1, radius: wrong })).toThrow(PhysicsDomainError);
  });
});
