import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { effusionVelocity } from "../../../../shared/physics/escape/effusionVelocity";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { log10EffusionVelocity } from "../../../../shared/physics/escape/log10EffusionVelocity";
import { logEffusionVelocity } from "../../../../shared/physics/escape/logEffusionVelocity";
import { thermalSpeed } from "../../../../shared/physics/escape/thermalSpeed";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { jeansCases } from "./jeansCases";

const seed = 20261201;
const particleMass = findGas("H")?.mass ?? NaN;
const hydrogen = { temperature: 1000, particleMass, escapeParameter: 7 };

/**
 * Flux of one particle per m³ through a plane, of those faster than the escape speed: in x = (v/v_p)²,
 * w = v_p/(2√π) ∫_λ^∞ x e^{−x} dx, by Simpson's rule to where e^{−x} has fallen by e^{−60}.
 */
function velocityByQuadrature(gas: typeof hydrogen): number {
  const parts = 6000;
  const step = 60 / parts;
  let sum = 0;
  for (let i = 0; i <= parts; i += 1) {
    const x = gas.escapeParameter + i * step;
    const weight = i === 0 || i === parts ? 1 : i % 2 === 1 ? 4 : 2;
    sum += weight * x * Math.exp(-x);
  }
  const thermal = Math.sqrt((2 * boltzmann.value * gas.temperature) / gas.particleMass);
  return ((thermal / (2 * Math.sqrt(Math.PI))) * sum * step) / 3;
}

describe("effusionVelocity", () => {
  it.each(jeansCases)("of $label is that of the independent program", (row) => {
    const gas = { ...row, escapeParameter: escapeParameter(row) };
    // An error of 1e-15 in λ shows as λ times that in w.
    expect(effusionVelocity(gas)).toAgreeWith({
      what: "effusion velocities of gases at five planets",
      unit: "m s⁻¹",
      published: row.effusionVelocity,
      within: { relative: 1e-12 * (1 + row.escapeParameter) },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of H at 500 km and 1000 K is 8.1295 m/s", () => {
    // GM = 398600.4355 km³ s⁻², r = 6871.0084 km, isotope mass.
    const place = {
      gravitationalParameter: 3.9860043550702266e14,
      radius: 6871008.4,
      temperature: 1000,
      particleMass,
    };
    const gas = { ...hydrogen, escapeParameter: escapeParameter(place) };
    expect(effusionVelocity(gas)).toAgreeWith({
      what: "effusion velocity of H at the Earth, 500 km, 1000 K",
      unit: "m s⁻¹",
      published: 8.1295,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("agrees with the Maxwellian integral it was derived from", () => {
    for (const lambda of [0, 0.3, 2, 7, 25]) {
      const gas = { ...hydrogen, escapeParameter: lambda };
      expect(effusionVelocity(gas)).toBeCloseToRelative(velocityByQuadrature(gas), 1e-8);
    }
  });

  it("tends to a quarter of the mean speed where nothing is bound", () => {
    const meanSpeed = Math.sqrt((8 * boltzmann.value * 1000) / (Math.PI * particleMass));
    expect(effusionVelocity({ ...hydrogen, escapeParameter: 0 })).toBeCloseToRelative(meanSpeed / 4, 1e-14);
  });

  it("never grows as the gas becomes more tightly bound", () => {
    const lambda = fc.double({ min: 0, max: 700, noNaN: true });
    fc.assert(
      fc.property(lambda, lambda, (a, b) => {
        const [loose, tight] = a < b ? [a, b] : [b, a];
        return (
          effusionVelocity({ ...hydrogen, escapeParameter: tight }) <=
          effusionVelocity({ ...hydrogen, escapeParameter: loose }) * (1 + 1e-15)
        );
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses a temperature or mass of %s", (wrong) => {
    expect(() => effusionVelocity({ ...hydrogen, temperature: wrong })).toThrow(PhysicsDomainError);
    expect(() => effusionVelocity({ ...hydrogen, particleMass: wrong })).toThrow(PhysicsDomainError);
  });

  it.each([-1e-9, NaN, Infinity])("refuses an escape parameter of %s", (wrong) => {
    expect(() => effusionVelocity({ ...hydrogen, escapeParameter: wrong })).toThrow(PhysicsDomainError);
    expect(() => logEffusionVelocity({ ...hydrogen, escapeParameter: wrong })).toThrow(PhysicsDomainError);
    expect(() => log10EffusionVelocity({ ...hydrogen, escapeParameter: wrong })).toThrow(PhysicsDomainError);
  });
});

describe("log10EffusionVelocity", () => {
  it.each(jeansCases)("of $label is that of the independent program", (row) => {
    const gas = { ...row, escapeParameter: escapeParameter(row) };
    expect(log10EffusionVelocity(gas)).toAgreeWith({
      what: "log₁₀ of effusion velocities of gases at five planets",
      unit: "1",
      published: Math.log10(row.effusionVelocity),
      within: { absolute: 1e-12 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("goes on where the velocity itself is too small for a number", () => {
    const tight = { ...hydrogen, escapeParameter: 2000 };
    expect(effusionVelocity(tight)).toBe(0);
    // By hand: v_p/2√π = 1145.86 m/s, log10 3.05913; log10 2001 = 3.30125; 2000 log10 e = 868.58896.
    expect(log10EffusionVelocity(tight)).toAgreeWith({
      what: "log₁₀ of the effusion velocity of H at λ = 2000, 1000 K",
      unit: "1",
      published: 3.05913 + 3.30125 - 868.58896,
      within: { absolute: 5e-5 },
      source: "Arithmetic",
      mark: "computed independently",
    });
  });

  it("is the logarithm of the velocity", () => {
    const lambda = fc.double({ min: 0, max: 600, noNaN: true });
    fc.assert(
      fc.property(lambda, (escapeParameter) => {
        const gas = { ...hydrogen, escapeParameter };
        const direct = effusionVelocity(gas);
        return (
          Math.abs(log10EffusionVelocity(gas) - Math.log10(direct)) < 1e-13 &&
          Math.abs(logEffusionVelocity(gas) - Math.log(direct)) < 3e-13
        );
      }),
      { seed },
    );
  });

  it("starts from the thermal speed", () => {
    const unbound = { ...hydrogen, escapeParameter: 0 };
    const expected = Math.log(thermalSpeed(hydrogen) / (2 * Math.sqrt(Math.PI)));
    expect(logEffusionVelocity(unbound)).toBeCloseToRelative(expected, 1e-14);
  });
});
