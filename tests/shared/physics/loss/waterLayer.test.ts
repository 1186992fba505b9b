import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { julianYear } from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { moleculesFromWaterLayer } from "../../../../shared/physics/loss/moleculesFromWaterLayer";
import { waterLayerFromMolecules, waterMass } from "../../../../shared/physics/loss/waterLayerFromMolecules";
import { waterPerParticle } from "../../../../shared/physics/loss/waterPerParticle";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const radius = 3389.5e3;

describe("waterLayerFromMolecules", () => {
  it("of 1e8 H cm⁻² s⁻¹ for 1 Gyr is 0.472 m", () => {
    // With H2O of 18.0153 u; two atoms of H a molecule.
    const atoms = 1e12 * 4 * Math.PI * radius ** 2 * 1e9 * julianYear.value;
    const molecules = atoms * (waterPerParticle("H") ?? NaN);
    expect(waterLayerFromMolecules({ molecules, radius })).toAgreeWith({
      what: "water layer of 1e8 H cm⁻² s⁻¹ for 1 Gyr on Mars",
      unit: "m",
      published: 0.472,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(waterLayerFromMolecules({ molecules, radius })).toAgreeWith({
      what: "water layer of 1e8 H cm⁻² s⁻¹ for 1 Gyr on Mars, to six digits",
      unit: "m",
      published: 0.472024,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of the Earth's oceans is 2,745 m", () => {
    // 1.4e21 kg, from memory.
    const depth = waterLayerFromMolecules({ molecules: 4.67991e46, radius: 6371.0084e3 });
    expect(depth).toAgreeWith({
      what: "water layer of 4.67991e46 molecules, the Earth's oceans",
      unit: "m",
      published: 2744.7,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("weighs, over its area, what its molecules weigh", () => {
    const depth = waterLayerFromMolecules({ molecules: 1e43, radius });
    expect(depth * 4 * Math.PI * radius ** 2 * 1000).toBeCloseToRelative(1e43 * waterMass, 1e-14);
  });

  it("is nothing for no water", () => {
    expect(waterLayerFromMolecules({ molecules: 0, radius })).toBe(0);
  });

  it("is undone by its inverse", () => {
    const amount = fc.double({ min: 1, max: 1e50, noNaN: true });
    fc.assert(
      fc.property(amount, (molecules) => {
        const depth = waterLayerFromMolecules({ molecules, radius });
        return Math.abs(moleculesFromWaterLayer({ depth, radius }) / molecules - 1) < 1e-15;
      }),
      { seed },
    );
  });

  it.each([-1, NaN, Infinity])("refuses %s molecules", (molecules) => {
    expect(() => waterLayerFromMolecules({ molecules, radius })).toThrow(PhysicsDomainError);
  });

  it.each([0, -1, NaN])("refuses a radius of %s m", (wrong) => {
    expect(() => waterLayerFromMolecules({ molecules: 1, radius: wrong })).toThrow(PhysicsDomainError);
  });
});

describe("moleculesFromWaterLayer", () => {
  it.each([
    // Mass of a layer of 1 m, kg.
    ["Mars", 3389.5e3, 1.443714e17],
    ["Venus", 6051.8e3, 4.602343e17],
    ["the Earth", 6371.0084e3, 5.100658e17],
  ])("of 1 m on %s weigh what is computed independently", (planet, size, mass) => {
    const molecules = moleculesFromWaterLayer({ depth: 1, radius: size });
    expect(molecules * waterMass).toAgreeWith({
      what: `mass of 1 m of water on ${planet}`,
      unit: "kg",
      published: mass,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("hold 9.652082e42 atoms of H on Mars", () => {
    expect(2 * moleculesFromWaterLayer({ depth: 1, radius })).toAgreeWith({
      what: "atoms of H in 1 m of water on Mars",
      unit: "1",
      published: 9.652082e42,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("are none in no layer, and go with the depth", () => {
    expect(moleculesFromWaterLayer({ depth: 0, radius })).toBe(0);
    const depth = fc.double({ min: 1e-9, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(
        depth,
        (d) =>
          Math.abs(
            moleculesFromWaterLayer({ depth: 3 * d, radius }) /
              moleculesFromWaterLayer({ depth: d, radius }) -
              3,
          ) < 1e-14,
      ),
      { seed },
    );
  });

  it("refuse a negative depth and a radius of zero", () => {
    expect(() => moleculesFromWaterLayer({ depth: -1, radius })).toThrow(PhysicsDomainError);
    expect(() => moleculesFromWaterLayer({ depth: 1, radius: 0 })).toThrow(PhysicsDomainError);
  });
});

describe("waterPerParticle", () => {
  it.each([
    // By the atoms in H2O.
    ["H", 0.5],
    ["H2", 1],
    ["O", 1],
    ["H2O", 1],
  ])("of %s is %s", (formula, share) => {
    expect(waterPerParticle(formula)).toBe(share);
  });

  it.each(["D", "O2", "CO2", "He", "h2o", "constructor"])("of %s is none", (formula) => {
    expect(waterPerParticle(formula)).toBeNull();
  });
});
