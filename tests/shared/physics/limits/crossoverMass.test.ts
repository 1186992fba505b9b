import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { atomicMass, boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { columnCrossoverMass } from "../../../../shared/physics/limits/columnCrossoverMass";
import { crossoverMass } from "../../../../shared/physics/limits/crossoverMass";
import { limitLevel } from "../../../../shared/physics/limits/limitLevel";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { eightGases, sampleColumn } from "../column/sampleColumns";

const seed = 20261201;

/** H with b = 4.8e17 T^0.75 cm⁻¹ s⁻¹, all of the gas. */
function hydrogen({ fluxCm = 1e13, temperature = 400, gravity = 9.82 } = {}) {
  return {
    particleMass: 1.00782503223 * atomicMass.value,
    temperature,
    flux: fluxCm * 1e4,
    collisionParameter: 4.8e19 * temperature ** 0.75,
    gravity,
    moleFraction: 1,
  };
}

describe("crossoverMass", () => {
  it.each([
    // From the formula of Hunten, Pepin and Walker (1987), in u.
    ["the Earth, 1e13 cm⁻² s⁻¹", {}, 8.8964],
    ["the Earth, 1e14 cm⁻² s⁻¹", { fluxCm: 1e14 }, 79.893],
    ["Mars, 1e13 cm⁻² s⁻¹", { gravity: 3.71 }, 21.888],
    ["the Earth, 5e13 cm⁻² s⁻¹ at 1000 K", { fluxCm: 5e13, temperature: 1000 }, 50.604],
  ])("of H at %s is the one computed independently", (place, given, massU) => {
    expect(crossoverMass(hydrogen(given)) / atomicMass.value).toAgreeWith({
      what: `crossover mass of H at ${place}, formula of Hunten, Pepin and Walker (1987)`,
      unit: "u",
      published: massU,
      within: { relative: 2e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it.each([
    // The same: flux of H that begins to take O (15.999 u) along, in cm⁻² s⁻¹.
    [9.82, 1.8999e13],
    [3.71, 7.1777e12],
  ])("at g = %s m/s² is that of O for %s cm⁻² s⁻¹", (gravity, fluxCm) => {
    expect(crossoverMass(hydrogen({ gravity, fluxCm })) / atomicMass.value).toAgreeWith({
      what: `crossover mass at the flux of H that begins to take O along, g = ${gravity} m/s²`,
      unit: "u",
      published: 15.999,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is the mass whose weight the drag of the flow just bears", () => {
    // Force on one heavy particle at rest: kT Φ₁/(b X₁) up, (m − m₁) g down beyond what the light gas's pressure bears.
    const gas = hydrogen();
    const drag = (boltzmann.value * gas.temperature * gas.flux) / gas.collisionParameter;
    const weight = (crossoverMass(gas) - gas.particleMass) * gas.gravity;
    expect(weight).toBeCloseToRelative(drag, 1e-13);
  });

  it("is the light gas's own mass without a flow", () => {
    expect(crossoverMass(hydrogen({ fluxCm: 0 }))).toBe(hydrogen().particleMass);
  });

  it("exceeds the light mass by what goes with the flux", () => {
    const factor = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    const excess = crossoverMass(hydrogen()) - hydrogen().particleMass;
    fc.assert(
      fc.property(factor, (f) => {
        const mass = crossoverMass(hydrogen({ fluxCm: 1e13 * f }));
        return Math.abs((mass - hydrogen().particleMass) / (excess * f) - 1) < 1e-11;
      }),
      { seed },
    );
  });

  it.each([
    { particleMass: 0 },
    { temperature: -1 },
    { flux: -1 },
    { flux: NaN },
    { collisionParameter: 0 },
    { gravity: 0 },
    { moleFraction: 0 },
    { moleFraction: 1.5 },
  ])("refuses %o", (wrong) => {
    expect(() => crossoverMass({ ...hydrogen(), ...wrong })).toThrow(PhysicsDomainError);
  });
});

describe("columnCrossoverMass", () => {
  const column = solveColumn(sampleColumn());
  const names = Object.keys(eightGases);
  const rates = names.map((name) => ({ H: 26.5, H2: 26.3 })[name] ?? 10);

  it("takes the gas with the largest mass rate against the most abundant heavier one", () => {
    const answer = columnCrossoverMass(column, rates);
    // 2 × 10^26.3 is more than 10^26.5.
    expect(answer).toMatchObject({ exists: true, light: names.indexOf("H2"), heavy: names.indexOf("CO2") });
  });

  it("is the formula with what the column has at the homopause of the light one", () => {
    const light = names.indexOf("H2");
    const { level } = limitLevel(column, light);
    const { coefficient, exponent } = column.input.collisionParameters[light][names.indexOf("CO2")];
    const flux = 10 ** 26.3 / (4 * Math.PI * level.radius ** 2);
    const { mass } = column.input.gases[light];
    const drag =
      (boltzmann.value * level.temperature * flux) /
      (coefficient * level.temperature ** exponent * level.gravity * level.moleFractions[light]);
    const answer = columnCrossoverMass(column, rates);
    expect(answer.exists && answer.mass).toBeCloseToRelative(mass + drag, 1e-12);
    expect(answer.exists && answer.altitude).toBe(level.altitude);
  });

  it("of H that leaves at the diffusion limit is the mean mass of what it leaves behind", () => {
    // Hunten, Pepin and Walker (1987): at the limit, Φ = b X (m_a − m) g/kT, the crossover mass is m_a itself.
    const two = solveColumn(
      sampleColumn({
        fractions: { CO2: 1, H: 1e-6 },
        temperature: { kind: "constant", temperature: 180 },
      }),
    );
    const { level } = limitLevel(two, 1);
    const [co2, h] = two.input.gases;
    const { coefficient, exponent } = two.input.collisionParameters[0][1];
    const lift = ((co2.mass - h.mass) * level.gravity) / (boltzmann.value * 180);
    const flux = coefficient * 180 ** exponent * level.moleFractions[1] * lift;
    const rate = Math.log10(flux * 4 * Math.PI * level.radius ** 2);
    const answer = columnCrossoverMass(two, [-Infinity, rate]);
    expect(answer.exists && answer.mass).toBeCloseToRelative(co2.mass, 1e-11);
  });

  it("is the light mass where nothing leaves, and there is none without a heavier gas", () => {
    const nothing = columnCrossoverMass(
      column,
      names.map(() => -Infinity),
    );
    expect(nothing.exists).toBe(false);
    const alone = solveColumn(sampleColumn({ fractions: { N2: 1 } }));
    expect(columnCrossoverMass(alone, [20])).toEqual({ exists: false, reason: "no_heavier_gas" });
  });

  it("refuses rates that are not one for each gas", () => {
    expect(() => columnCrossoverMass(column, [1, 2])).toThrow(PhysicsDomainError);
  });
});
