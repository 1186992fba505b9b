import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { escapeSpeed } from "../../../../shared/physics/body/escapeSpeed";
import { gravity } from "../../../../shared/physics/body/gravity";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findBody } from "../../../../shared/physics/handbook/handbookBodies";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const size = fc.double({ min: 1e4, max: 1e9, noNaN: true });
const mass = fc.double({ min: 1e8, max: 1e18, noNaN: true });

describe("escapeSpeed", () => {
  it.each([
    // km/s, at the mean radius.
    ["Earth", 11.19],
    ["Mars", 5.03],
    ["Venus", 10.36],
    ["Moon", 2.38],
  ])("of %s is %s km/s", (name, speedKm) => {
    const body = findBody(name);
    if (!body) throw new Error(`no ${name} in the handbook`);
    expect(escapeSpeed(body) / 1e3).toAgreeWith({
      what: `escape speed of ${name} at the mean radius`,
      unit: "km s⁻¹",
      published: speedKm,
      within: { absolute: 0.005 },
      source: "NSSDC",
      mark: "from memory",
    });
  });

  it("at 500 km above the Earth is 10771.4 m/s", () => {
    // From GM = 398600.4355 km³ s⁻² and r = 6871.0084 km.
    const place = { gravitationalParameter: 3.9860043550702266e14, radius: 6871008.4 };
    expect(escapeSpeed(place)).toAgreeWith({
      what: "escape speed 500 km above the Earth",
      unit: "m s⁻¹",
      published: 10771.4,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is the speed at which kinetic energy equals the work of climbing out", () => {
    // ∫ g dr from r to infinity in u = 1/r, where g dr = GM du: midpoint rule on g/u².
    const place = { gravitationalParameter: 4e14, radius: 7e6 };
    let work = 0;
    const parts = 1000;
    for (let i = 0; i < parts; i += 1) {
      const u = (i + 0.5) / parts / place.radius;
      work += (gravity({ ...place, radius: 1 / u }) / (u * u)) * (1 / parts / place.radius);
    }
    expect(escapeSpeed(place)).toBeCloseToRelative(Math.sqrt(2 * work), 1e-12);
  });

  it("vanishes far away", () => {
    expect(escapeSpeed({ gravitationalParameter: 4e14, radius: 1e20 })).toBeLessThan(3e-3);
  });

  it("is √2 times the speed of a circular orbit", () => {
    fc.assert(
      fc.property(mass, size, (gravitationalParameter, radius) => {
        const orbital = Math.sqrt(gravity({ gravitationalParameter, radius }) * radius);
        const ratio = escapeSpeed({ gravitationalParameter, radius }) / orbital;
        return Math.abs(ratio - Math.SQRT2) < 1e-15 * 4;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => escapeSpeed({ gravitationalParameter: wrong, radius: 1 })).toThrow(PhysicsDomainError);
    expect(() => escapeSpeed({ gravitationalParameter: 1, radius: wrong })).toThrow(PhysicsDomainError);
  });
});
