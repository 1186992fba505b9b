import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { julianYear } from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { particlesFromSurfacePressure } from "../../../../shared/physics/loss/particlesFromSurfacePressure";
import { surfacePressureFromParticles } from "../../../../shared/physics/loss/surfacePressureFromParticles";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const mars = { gravity: 3.727866, radius: 3389.5e3, particleMass: findGas("CO2")!.mass };

describe("surfacePressureFromParticles", () => {
  it("of 4.3e25 O/s for 1 Gyr on Mars is 9.31 mbar", () => {
    // Lillis et al. (2017) give the rate.
    const oxygen = { ...mars, particleMass: findGas("O")!.mass, particles: 4.3e25 * 1e9 * julianYear.value };
    expect(surfacePressureFromParticles(oxygen) / 100).toAgreeWith({
      what: "surface pressure of 4.3e25 O/s for 1 Gyr on Mars",
      unit: "mbar",
      published: 9.31,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of 6.06e23 C/s for 3.6 Gyr on Mars is 1.3 mbar, as CO2", () => {
    // Of 3e23 to 11e23 C/s.
    const particles = 6.06e23 * 3.6e9 * julianYear.value;
    expect(surfacePressureFromParticles({ ...mars, particles }) / 100).toAgreeWith({
      what: "surface pressure as CO2 of 6.06e23 C/s for 3.6 Gyr on Mars",
      unit: "mbar",
      published: 1.3,
      within: { relative: 0.1 },
      source: "Lo2021",
      mark: "published",
    });
  });

  it("is the weight of what lies on a square metre", () => {
    const pressure = surfacePressureFromParticles({ ...mars, particles: 1e43 });
    const perSquareMetre = 1e43 / (4 * Math.PI * mars.radius ** 2);
    expect(pressure).toBeCloseToRelative(perSquareMetre * mars.particleMass * mars.gravity, 1e-14);
  });

  it("is nothing for nothing", () => {
    expect(surfacePressureFromParticles({ ...mars, particles: 0 })).toBe(0);
  });

  it("is undone by its inverse", () => {
    const amount = fc.double({ min: 1, max: 1e50, noNaN: true });
    fc.assert(
      fc.property(amount, (particles) => {
        const pressure = surfacePressureFromParticles({ ...mars, particles });
        return Math.abs(particlesFromSurfacePressure({ ...mars, pressure }) / particles - 1) < 1e-15;
      }),
      { seed },
    );
  });

  it.each([{ particles: -1 }, { particleMass: 0 }, { gravity: NaN }, { radius: 0 }])(
    "refuses %o",
    (wrong) => {
      expect(() => surfacePressureFromParticles({ ...mars, particles: 1, ...wrong })).toThrow(
        PhysicsDomainError,
      );
    },
  );
});

describe("particlesFromSurfacePressure", () => {
  it.each([
    // 1 bar of CO2: g, radius, kg/m², molecules.
    ["Mars", 3.727866, 3389.5e3, 26824.998, 5.299383e43],
    ["Venus", 8.870033, 6051.8e3, 11273.916, 7.099998e43],
    ["the Earth", 9.820224, 6371.0084e3, 10183.0667, 7.107376e43],
  ])("of 1 bar of CO2 on %s", (planet, gravity, radius, column, molecules) => {
    const particles = particlesFromSurfacePressure({ ...mars, gravity, radius, pressure: 1e5 });
    expect(particles).toAgreeWith({
      what: `molecules in 1 bar of CO2 on ${planet}`,
      unit: "1",
      published: molecules,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    const perSquareMetre = (particles * mars.particleMass) / (4 * Math.PI * radius ** 2);
    expect(perSquareMetre).toAgreeWith({
      what: `mass of 1 bar of CO2 on ${planet}`,
      unit: "kg m⁻²",
      published: column,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("are as many as a column in balance holds overhead", () => {
    // Weight of a thin isothermal column, n m g dz upward, by steps: p = Σ n m g Δz.
    const [scale, steps] = [1e4, 20000];
    let pressure = 0;
    let overhead = 0;
    for (let i = 0; i < steps; i += 1) {
      const z = (40 * scale * (i + 0.5)) / steps;
      const shell = 1e20 * Math.exp(-z / scale) * ((40 * scale) / steps);
      pressure += shell * mars.particleMass * mars.gravity;
      overhead += shell;
    }
    const expected = overhead * 4 * Math.PI * mars.radius ** 2;
    expect(particlesFromSurfacePressure({ ...mars, pressure })).toBeCloseToRelative(expected, 1e-12);
  });

  it("are none without pressure, and go with it", () => {
    expect(particlesFromSurfacePressure({ ...mars, pressure: 0 })).toBe(0);
    const one = particlesFromSurfacePressure({ ...mars, pressure: 1 });
    expect(particlesFromSurfacePressure({ ...mars, pressure: 1e5 })).toBeCloseToRelative(1e5 * one, 1e-15);
  });

  it.each([{ pressure: -1 }, { particleMass: 0 }, { gravity: 0 }, { radius: NaN }])("refuse %o", (wrong) => {
    expect(() => particlesFromSurfacePressure({ ...mars, pressure: 1, ...wrong })).toThrow(
      PhysicsDomainError,
    );
  });
});
