import { describe, expect, it } from "vitest";

import {
  atomicMass,
  avogadro,
  boltzmann,
  codata2022,
  electronMass,
  elementaryCharge,
  gravitationalConstant,
} from "../../../../shared/physics/constants/codata2022";
import {
  astronomicalUnit,
  iau,
  julianYear,
  nominalEarthGravitationalParameter,
  nominalJupiterGravitationalParameter,
  nominalSolarGravitationalParameter,
  nominalSolarIrradiance,
  nominalSolarLuminosity,
} from "../../../../shared/physics/constants/iau";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

describe("constants", () => {
  it("say what they are, in which unit, how well known and from where", () => {
    for (const constant of [...codata2022, ...iau]) {
      for (const text of [constant.symbol, constant.name, constant.unit, constant.source]) {
        expect(text.trim()).toBe(text);
        expect(text).not.toBe("");
      }
      expect(constant.value).toBeGreaterThan(0);
      expect(constant.uncertainty).toBeGreaterThanOrEqual(0);
      expect(constant.uncertainty).toBeLessThan(1e-4 * constant.value);
    }
    const symbols = [...codata2022, ...iau].map(({ symbol }) => symbol);
    expect(new Set(symbols).size).toBe(symbols.length);
  });

  it("are exact where the SI and the IAU fix them", () => {
    expect(boltzmann.value).toAgreeWith({
      what: "Boltzmann constant",
      unit: "J K⁻¹",
      published: 1.380649e-23,
      within: { relative: 0 },
      source: "CODATA2022",
      mark: "published",
    });
    expect(avogadro.value).toAgreeWith({
      what: "Avogadro constant",
      unit: "mol⁻¹",
      published: 6.02214076e23,
      within: { relative: 0 },
      source: "CODATA2022",
      mark: "published",
    });
    expect(elementaryCharge.value).toAgreeWith({
      what: "elementary charge",
      unit: "C",
      published: 1.602176634e-19,
      within: { relative: 0 },
      source: "CODATA2022",
      mark: "published",
    });
    expect(astronomicalUnit.value).toAgreeWith({
      what: "astronomical unit",
      unit: "m",
      published: 149597870700,
      within: { relative: 0 },
      source: "IAU2012B2",
      mark: "published",
    });
    expect(julianYear.value).toBe(365.25 * 86400);
    for (const { uncertainty } of [boltzmann, avogadro, elementaryCharge, ...iau])
      expect(uncertainty).toBe(0);
  });

  it("give the electron its share of the dalton", () => {
    expect(electronMass.value / atomicMass.value).toAgreeWith({
      what: "relative atomic mass of the electron",
      unit: "1",
      published: 5.485799090441e-4,
      within: { relative: 1e-9 },
      source: "CODATA2022",
      mark: "from memory",
    });
  });

  it("agree with the molar mass constant", () => {
    expect(atomicMass.value * avogadro.value).toAgreeWith({
      what: "molar mass constant, 1.00000000105(31)e-3",
      unit: "kg mol⁻¹",
      published: 1.00000000105e-3,
      within: { relative: 5e-12 },
      source: "CODATA2022",
      mark: "from memory",
    });
  });

  it("give the known masses of the Sun, the Earth and Jupiter", () => {
    // To the digits written.
    const mass = (gm: number) => gm / gravitationalConstant.value;
    expect(mass(nominalSolarGravitationalParameter.value)).toAgreeWith({
      what: "mass of the Sun",
      unit: "kg",
      published: 1.9884e30,
      within: { relative: 3e-5 },
      source: "NSSDC",
      mark: "from memory",
    });
    expect(mass(nominalEarthGravitationalParameter.value)).toAgreeWith({
      what: "mass of the Earth",
      unit: "kg",
      published: 5.9722e24,
      within: { relative: 3e-5 },
      source: "NSSDC",
      mark: "from memory",
    });
    expect(mass(nominalJupiterGravitationalParameter.value)).toAgreeWith({
      what: "mass of Jupiter",
      unit: "kg",
      published: 1.8981e27,
      within: { relative: 3e-5 },
      source: "NSSDC",
      mark: "from memory",
    });
  });

  it("make the solar irradiance that of the luminosity at 1 au", () => {
    const sphere = 4 * Math.PI * astronomicalUnit.value ** 2;
    expect(nominalSolarLuminosity.value / sphere).toBeCloseToRelative(nominalSolarIrradiance.value, 5e-4);
  });
});
