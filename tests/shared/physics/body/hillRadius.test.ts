import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { hillRadius } from "../../../../shared/physics/body/hillRadius";
import {
  astronomicalUnit,
  nominalEarthGravitationalParameter,
  nominalJupiterGravitationalParameter,
  nominalJupiterRadius,
  nominalSolarGravitationalParameter,
} from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

const earth = {
  gravitationalParameter: nominalEarthGravitationalParameter.value,
  starGravitationalParameter: nominalSolarGravitationalParameter.value,
  starDistance: astronomicalUnit.value,
};

describe("hillRadius", () => {
  it("of the Earth is 1.496 million km", () => {
    // As often quoted (0.01 au).
    expect(hillRadius(earth)).toAgreeWith({
      what: "Hill radius of the Earth",
      unit: "m",
      published: 1.496e9,
      within: { relative: 1e-3 },
      source: "Textbook",
      mark: "from memory",
    });
  });

  it("of a close-in giant is 4.1952 of its radii", () => {
    // 0.682 and 1.359 Jupiters, 0.04707 au, 1.119 Suns; the program does not say which GM it
    // took for the two, and older values of their ratio differ by 1 part in 10⁴, a third of which reaches the radius.
    const radius = hillRadius({
      gravitationalParameter: 0.682 * nominalJupiterGravitationalParameter.value,
      starGravitationalParameter: 1.119 * nominalSolarGravitationalParameter.value,
      starDistance: 0.04707 * astronomicalUnit.value,
    });
    expect(radius / (1.359 * nominalJupiterRadius.value)).toAgreeWith({
      what: "Hill radius of a close-in giant over its radius",
      unit: "1",
      published: 4.1952,
      within: { relative: 4e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("balances the star's tide: GM/r² = 3 GM★ r/a³", () => {
    const r = hillRadius(earth);
    const tide = (3 * earth.starGravitationalParameter * r) / earth.starDistance ** 3;
    expect(earth.gravitationalParameter / r ** 2).toBeCloseToRelative(tide, 1e-14);
  });

  it("shrinks to nothing with the body", () => {
    expect(hillRadius({ ...earth, gravitationalParameter: 1e-10 })).toBeLessThan(20);
  });

  it("grows in step with the orbit and with the cube root of the mass", () => {
    const scale = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(scale, (factor) => {
        const wider = hillRadius({ ...earth, starDistance: earth.starDistance * factor });
        const heavier = hillRadius({
          ...earth,
          gravitationalParameter: earth.gravitationalParameter * factor ** 3,
        });
        const expected = hillRadius(earth) * factor;
        return Math.abs(wider / expected - 1) < 1e-15 && Math.abs(heavier / expected - 1) < 2e-15;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    for (const key of ["gravitationalParameter", "starGravitationalParameter", "starDistance"] as const) {
      expect(() => hillRadius({ ...earth, [key]: wrong })).toThrow(PhysicsDomainError);
    }
  });
});
