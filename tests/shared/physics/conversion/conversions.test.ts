import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { gravitationalConstant } from "../../../../shared/physics/constants/codata2022";
import { crossSectionFromDiameter } from "../../../../shared/physics/conversion/crossSectionFromDiameter";
import { diameterFromCrossSection } from "../../../../shared/physics/conversion/diameterFromCrossSection";
import { gravitationalParameterFromMass } from "../../../../shared/physics/conversion/gravitationalParameterFromMass";
import { massFromGravitationalParameter } from "../../../../shared/physics/conversion/massFromGravitationalParameter";
import { meanMass } from "../../../../shared/physics/conversion/meanMass";
import { numberDensityFromPressure } from "../../../../shared/physics/conversion/numberDensityFromPressure";
import { pressureFromNumberDensity } from "../../../../shared/physics/conversion/pressureFromNumberDensity";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const positive = fc.double({ min: 1e-20, max: 1e20, noNaN: true });
const isSame = (a: number, b: number) => Math.abs(a - b) <= 4e-16 * Math.abs(b);

describe("numberDensityFromPressure and pressureFromNumberDensity", () => {
  it("give the Loschmidt constant at 273.15 K and 101,325 Pa", () => {
    const density = numberDensityFromPressure({ pressure: 101325, temperature: 273.15 });
    expect(density).toAgreeWith({
      what: "Loschmidt constant at 273.15 K and 101,325 Pa",
      unit: "m⁻³",
      published: 2.686780111e25,
      within: { relative: 1e-9 },
      source: "CODATA2022",
      mark: "from memory",
    });
    expect(pressureFromNumberDensity({ numberDensity: density, temperature: 273.15 })).toBeCloseToRelative(
      101325,
      1e-15,
    );
  });

  it("give one mole in 22.414 litres", () => {
    const density = numberDensityFromPressure({ pressure: 101325, temperature: 273.15 });
    expect(6.02214076e23 / density).toAgreeWith({
      what: "molar volume at 273.15 K and 101,325 Pa",
      unit: "m³ mol⁻¹",
      published: 22.41396954e-3,
      within: { relative: 1e-9 },
      source: "CODATA2022",
      mark: "from memory",
    });
  });

  it("undo each other, and give nothing for nothing", () => {
    fc.assert(
      fc.property(positive, positive, (pressure, temperature) => {
        const numberDensity = numberDensityFromPressure({ pressure, temperature });
        return isSame(pressureFromNumberDensity({ numberDensity, temperature }), pressure);
      }),
      { seed },
    );
    expect(numberDensityFromPressure({ pressure: 0, temperature: 200 })).toBe(0);
    expect(pressureFromNumberDensity({ numberDensity: 0, temperature: 200 })).toBe(0);
  });

  it.each([0, -1, NaN, Infinity])("refuse a temperature of %s K", (temperature) => {
    expect(() => numberDensityFromPressure({ pressure: 1, temperature })).toThrow(PhysicsDomainError);
    expect(() => pressureFromNumberDensity({ numberDensity: 1, temperature })).toThrow(PhysicsDomainError);
  });

  it.each([-1, NaN, Infinity])("refuse a pressure or density of %s", (wrong) => {
    expect(() => numberDensityFromPressure({ pressure: wrong, temperature: 200 })).toThrow(
      PhysicsDomainError,
    );
    expect(() => pressureFromNumberDensity({ numberDensity: wrong, temperature: 200 })).toThrow(
      PhysicsDomainError,
    );
  });
});

describe("meanMass", () => {
  it("of air is 28.964 u", () => {
    // U.S. Standard Atmosphere 1976: composition and molar masses near the ground; 28.9644 kg/kmol.
    const air = [
      { mass: 28.0134, amount: 0.78084 },
      { mass: 31.9988, amount: 0.209476 },
      { mass: 39.948, amount: 0.00934 },
      { mass: 44.00995, amount: 0.000314 },
    ];
    expect(meanMass(air)).toAgreeWith({
      what: "mean molar mass of air",
      unit: "kg kmol⁻¹",
      published: 28.9644,
      within: { relative: 2e-5 },
      source: "USSA1976",
      mark: "published",
    });
  });

  it("is total mass over total number, particle by particle", () => {
    const particles = [1, 1, 1, 4, 4, 16];
    const mean = particles.reduce((sum, mass) => sum + mass, 0) / particles.length;
    const gases = [
      { mass: 1, amount: 3 },
      { mass: 4, amount: 2 },
      { mass: 16, amount: 1 },
    ];
    expect(meanMass(gases)).toBeCloseToRelative(mean, 1e-15);
  });

  it("of one gas, or where the others are absent, is its own", () => {
    expect(meanMass([{ mass: 3e-26, amount: 7 }])).toBe(3e-26);
    expect(
      meanMass([
        { mass: 3e-26, amount: 1 },
        { mass: 1, amount: 0 },
      ]),
    ).toBe(3e-26);
  });

  it("lies between the lightest and the heaviest and does not mind the scale of the amounts", () => {
    const gas = fc.record({ mass: fc.double({ min: 1, max: 50, noNaN: true }), amount: positive });
    fc.assert(
      fc.property(fc.array(gas, { minLength: 1, maxLength: 8 }), (gases) => {
        const mean = meanMass(gases);
        const masses = gases.map(({ mass }) => mass);
        const scaled = meanMass(gases.map(({ mass, amount }) => ({ mass, amount: 1024 * amount })));
        return (
          mean >= Math.min(...masses) * (1 - 1e-14) &&
          mean <= Math.max(...masses) * (1 + 1e-14) &&
          isSame(scaled, mean)
        );
      }),
      { seed },
    );
  });

  it("refuses no gas at all, a negative amount and a mass of zero", () => {
    expect(() => meanMass([])).toThrow(PhysicsDomainError);
    expect(() => meanMass([{ mass: 1, amount: 0 }])).toThrow(/sum of the amounts/);
    expect(() => meanMass([{ mass: 1, amount: -1 }])).toThrow(PhysicsDomainError);
    expect(() => meanMass([{ mass: 0, amount: 1 }])).toThrow(PhysicsDomainError);
  });
});

describe("massFromGravitationalParameter and gravitationalParameterFromMass", () => {
  it("give the Earth 5.9722e24 kg", () => {
    // To the digits written.
    expect(massFromGravitationalParameter(3.986004418e14)).toAgreeWith({
      what: "mass of the Earth from its GM",
      unit: "kg",
      published: 5.9722e24,
      within: { relative: 2e-5 },
      source: "NSSDC",
      mark: "from memory",
    });
  });

  it("give G for one kilogram", () => {
    expect(gravitationalParameterFromMass(1)).toBe(gravitationalConstant.value);
  });

  it("undo each other", () => {
    fc.assert(
      fc.property(positive, (mass) =>
        isSame(massFromGravitationalParameter(gravitationalParameterFromMass(mass)), mass),
      ),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuse %s", (wrong) => {
    expect(() => massFromGravitationalParameter(wrong)).toThrow(PhysicsDomainError);
    expect(() => gravitationalParameterFromMass(wrong)).toThrow(PhysicsDomainError);
  });
});

describe("crossSectionFromDiameter and diameterFromCrossSection", () => {
  it("give 4.185e-19 m² for 3.65 Å", () => {
    // The diameter of the U.S. Standard Atmosphere 1976.
    expect(crossSectionFromDiameter(3.65e-10)).toAgreeWith({
      what: "cross section of d = 3.65 Å",
      unit: "m²",
      published: 4.185e-19,
      within: { relative: 2e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(diameterFromCrossSection(4.1854e-19)).toAgreeWith({
      what: "diameter of 4.1854e-19 m²",
      unit: "m",
      published: 3.65e-10,
      within: { relative: 1e-4 },
      source: "USSA1976",
      mark: "published",
    });
  });

  it("undo each other", () => {
    fc.assert(
      fc.property(positive, (diameter) =>
        isSame(diameterFromCrossSection(crossSectionFromDiameter(diameter)), diameter),
      ),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuse %s", (wrong) => {
    expect(() => crossSectionFromDiameter(wrong)).toThrow(PhysicsDomainError);
    expect(() => diameterFromCrossSection(wrong)).toThrow(PhysicsDomainError);
  });
});
