import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { meanDensity } from "../../../../shared/physics/body/meanDensity";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { gravitationalConstant } from "../../../../shared/physics/constants/codata2022";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("meanDensity", () => {
  it("of the Earth is 5513 kg/m³", () => {
    const earth = { gravitationalParameter: 3.986004e14, radius: 6.371e6 };
    expect(meanDensity(earth)).toAgreeWith({
      what: "mean density of the Earth from GM = 3.986004e14 m³ s⁻²",
      unit: "kg m⁻³",
      published: 5513,
      within: { relative: 2e-4 },
      source: "NSSDC",
      mark: "from memory",
    });
  });

  it("times the volume is the mass", () => {
    const [mass, radius] = [6e24, 6.4e6];
    const density = meanDensity({ gravitationalParameter: gravitationalConstant.value * mass, radius });
    expect(density * (4 / 3) * Math.PI * radius ** 3).toBeCloseToRelative(mass, 1e-14);
  });

  it("is that of 1 kg in a sphere of 1 m³", () => {
    const radius = Math.cbrt(3 / (4 * Math.PI));
    expect(meanDensity({ gravitationalParameter: gravitationalConstant.value, radius })).toBeCloseToRelative(
      1,
      1e-14,
    );
  });

  it("falls with the cube of the radius", () => {
    const size = fc.double({ min: 1e4, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(size, (radius) => {
        const ratio =
          meanDensity({ gravitationalParameter: 1e14, radius }) /
          meanDensity({ gravitationalParameter: 1e14, radius: 2 * radius });
        return Math.abs(ratio - 8) < 1e-14;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => meanDensity({ gravitationalParameter: wrong, radius: 1 })).toThrow(PhysicsDomainError);
    expect(() => meanDensity({ gravitationalParameter: 1, radius: wrong })).toThrow(PhysicsDomainError);
  });
});
