import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { escapeSpeed } from "../../../../shared/physics/body/escapeSpeed";
import { gravity } from "../../../../shared/physics/body/gravity";
import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { thermalSpeed } from "../../../../shared/physics/escape/thermalSpeed";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { expectSameBoltzmann, jeansCases } from "./jeansCases";

const seed = 20261201;
const hydrogenMass = findGas("H")?.mass ?? NaN;

/** Hydrogen at the Earth's exobase. */
const hydrogen = {
  gravitationalParameter: 3.9860043550702266e14,
  radius: 6871008.4,
  temperature: 1000,
  particleMass: hydrogenMass,
};

describe("escapeParameter", () => {
  it.each(jeansCases)("of $label is that of the independent program", (row) => {
    expectSameBoltzmann(boltzmann.value);
    expect(escapeParameter(row)).toAgreeWith({
      what: "escape parameters of gases at five planets",
      unit: "1",
      published: row.escapeParameter,
      within: { relative: 1e-12 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of H at 500 km and 1000 K is 7.0318", () => {
    expect(escapeParameter(hydrogen)).toAgreeWith({
      what: "escape parameter of H at the Earth, 500 km, 1000 K",
      unit: "1",
      published: 7.0318,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of H2 at Saturn's exobase lies in the published 260 to 340", () => {
    // 2700 to 3000 km above 1 bar, 370 to 540 K.
    const saturn = {
      gravitationalParameter: 3.793120623436167e16,
      radius: 61082e3,
      temperature: 455,
      particleMass: findGas("H2")?.mass ?? NaN,
    };
    expect(escapeParameter(saturn)).toAgreeWith({
      what: "escape parameter of H2 at Saturn's exobase, 455 K",
      unit: "1",
      within: { range: [260, 340] },
      source: "Koskinen2013",
      mark: "published",
    });
  });

  it("is the square of escape speed over thermal speed, and radius over scale height", () => {
    const ratio = escapeSpeed(hydrogen) / thermalSpeed(hydrogen);
    expect(escapeParameter(hydrogen)).toBeCloseToRelative(ratio ** 2, 1e-14);
    const scaleHeight = (boltzmann.value * hydrogen.temperature) / (hydrogenMass * gravity(hydrogen));
    expect(escapeParameter(hydrogen)).toBeCloseToRelative(hydrogen.radius / scaleHeight, 1e-14);
  });

  it("vanishes far away", () => {
    expect(escapeParameter({ ...hydrogen, radius: 1e20 })).toBeLessThan(1e-12);
  });

  it("rises with mass and gravity, falls with temperature and distance, each in proportion", () => {
    const factor = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const heavier = escapeParameter({ ...hydrogen, particleMass: hydrogenMass * f });
        const hotter = escapeParameter({ ...hydrogen, temperature: 1000 / f });
        const farther = escapeParameter({ ...hydrogen, radius: hydrogen.radius / f });
        const expected = escapeParameter(hydrogen) * f;
        return [heavier, hotter, farther].every((value) => Math.abs(value / expected - 1) < 1e-15);
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    for (const key of Object.keys(hydrogen)) {
      expect(() => escapeParameter({ ...hydrogen, [key]: wrong })).toThrow(PhysicsDomainError);
    }
  });
});
