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
    expect(boltzmann.value).toBe(1.380649e-23);
    expect(avogadro.value).toBe(6.02214076e23);
    expect(elementaryCharge.value).toBe(1.602176634e-19);
    expect(astronomicalUnit.value).toBe(149597870700);
    expect(julianYear.value).toBe(365.25 * 86400);
    for (const { uncertainty } of [boltzmann, avogadro, elementaryCharge, ...iau])
      expect(uncertainty).toBe(0);
  });

  it("give the electron its share of the dalton", () => {
    // Relative atomic mass of the electron, CODATA 2022, from memory: 5.485799090441e-4.
    expect(electronMass.value / atomicMass.value).toBeCloseToRelative(5.485799090441e-4, 1e-9);
  });

  it("agree with the molar mass constant", () => {
    // CODATA 2022, from memory: 1.00000000105(31)e-3 kg/mol.
    expect(atomicMass.value * avogadro.value).toBeCloseToRelative(1.00000000105e-3, 5e-12);
  });

  it("give the known masses of the Sun, the Earth and Jupiter", () => {
    // 1.9884e30, 5.9722e24 and 1.8981e27 kg: from memory, to the digits written.
    const mass = (gm: number) => gm / gravitationalConstant.value;
    expect(mass(nominalSolarGravitationalParameter.value)).toBeCloseToRelative(1.9884e30, 3e-5);
    expect(mass(nominalEarthGravitationalParameter.value)).toBeCloseToRelative(5.9722e24, 3e-5);
    expect(mass(nominalJupiterGravitationalParameter.value)).toBeCloseToRelative(1.8981e27, 3e-5);
  });

  it("make the solar irradiance that of the luminosity at 1 au", () => {
    const sphere = 4 * Math.PI * astronomicalUnit.value ** 2;
    expect(nominalSolarLuminosity.value / sphere).toBeCloseToRelative(nominalSolarIrradiance.value, 5e-4);
  });
});
