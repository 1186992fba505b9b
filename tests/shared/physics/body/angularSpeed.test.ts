import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { angularSpeed } from "../../../../shared/physics/body/angularSpeed";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("angularSpeed", () => {
  it("of the Earth is 7.292115e-5 rad/s", () => {
    // Against the stars 86164.0989 s.
    expect(angularSpeed({ rotationPeriod: 86164.0989 })).toAgreeWith({
      what: "angular speed of the Earth",
      unit: "rad s⁻¹",
      published: 7.292115e-5,
      within: { relative: 1e-7 },
      source: "IERS",
      mark: "from memory",
    });
  });

  it("turns through a full circle in one period", () => {
    const rotationPeriod = 88642.44;
    let angle = 0;
    for (let i = 0; i < 1000; i += 1) angle += angularSpeed({ rotationPeriod }) * (rotationPeriod / 1000);
    expect(angle).toBeCloseToRelative(2 * Math.PI, 1e-12);
  });

  it("vanishes for an endless period", () => {
    expect(angularSpeed({ rotationPeriod: 1e300 })).toBeLessThan(1e-299);
  });

  it("keeps the sign of the period and halves when it doubles", () => {
    const period = fc.double({ min: 1, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(period, (rotationPeriod) => {
        const speed = angularSpeed({ rotationPeriod });
        return (
          speed > 0 &&
          angularSpeed({ rotationPeriod: -rotationPeriod }) === -speed &&
          angularSpeed({ rotationPeriod: 2 * rotationPeriod }) === speed / 2
        );
      }),
      { seed },
    );
  });

  it.each([0, NaN, Infinity, -Infinity])("refuses a period of %s s", (rotationPeriod) => {
    expect(() => angularSpeed({ rotationPeriod })).toThrow(PhysicsDomainError);
  });
});
