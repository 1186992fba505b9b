import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { effusionVelocity } from "../../../../shared/physics/escape/effusionVelocity";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { jeansFlux } from "../../../../shared/physics/escape/jeansFlux";
import { jeansRate } from "../../../../shared/physics/escape/jeansRate";
import { log10JeansFlux } from "../../../../shared/physics/escape/log10JeansFlux";
import { findBody } from "../../../../shared/physics/handbook/handbookBodies";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const particleMass = findGas("H")?.mass ?? NaN;
const hydrogen = { numberDensity: 8e10, temperature: 1000, particleMass, escapeParameter: 7 };

/** Hydrogen 250 km above Mars. */
function atMars(temperature: number, numberDensity: number) {
  const { gravitationalParameter = NaN, radius: surface = NaN } = findBody("Mars") ?? {};
  const radius = surface + 250e3;
  const lambda = escapeParameter({ gravitationalParameter, radius, temperature, particleMass });
  return { numberDensity, temperature, particleMass, escapeParameter: lambda };
}

describe("jeansFlux", () => {
  it("of Mars in 1969 is 1.8e8 cm⁻² s⁻¹", () => {
    // 350 K and 3e4 cm⁻³ at 250 km.
    expect(jeansFlux(atMars(350, 3e10))).toAgreeWith({
      what: "Jeans flux of H from Mars in 1969: 350 K, 3e4 cm⁻³ at 250 km",
      unit: "m⁻² s⁻¹",
      published: 1.8e12,
      within: { relative: 0.05 },
      source: "AndersonHord1971",
      mark: "from memory",
    });
    // From the same inputs.
    expect(jeansFlux(atMars(350, 3e10))).toAgreeWith({
      what: "Jeans flux of H from Mars in 1969: 350 K, 3e4 cm⁻³ at 250 km",
      unit: "m⁻² s⁻¹",
      published: 1.753e12,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of Mars at solar minimum is the same within 4 %", () => {
    // 170 K and 60 times the density.
    const minimum = jeansFlux(atMars(170, 1.8e12));
    expect(minimum).toAgreeWith({
      what: "Jeans flux of H from Mars at solar minimum: 170 K, 1.8e6 cm⁻³ at 250 km",
      unit: "m⁻² s⁻¹",
      published: 1.813e12,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(minimum / jeansFlux(atMars(350, 3e10))).toAgreeWith({
      what: "Jeans flux of H from Mars at solar minimum over that of 1969",
      unit: "1",
      published: 1,
      within: { relative: 0.04 },
      source: "Levine1978",
      mark: "published",
    });
  });

  it("of the 1976 standard at 500 km comes within 10 % of its adopted 7.2e7 cm⁻² s⁻¹", () => {
    // 8.0e4 cm⁻³ at 999.24 K, r₀ 6356.766 km, g₀ 9.80665 m/s².
    const place = {
      gravitationalParameter: 9.80665 * 6356766 ** 2,
      radius: 6856766,
      temperature: 999.2356,
      particleMass,
    };
    const flux = jeansFlux({ ...hydrogen, temperature: 999.2356, escapeParameter: escapeParameter(place) });
    expect(flux).toAgreeWith({
      what: "Jeans flux of H in the 1976 standard at 500 km, beside the flux adopted there",
      unit: "m⁻² s⁻¹",
      published: 7.2e11,
      within: { relative: 0.1 },
      source: "Minzner1976",
      mark: "published",
    });
  });

  it("counts the fast particles of a Maxwellian that cross a plane", () => {
    // ∫ v_z f d³v over v > v_e, v_z > 0, on a grid in speed and angle.
    const scale = Math.sqrt((2 * boltzmann.value * hydrogen.temperature) / particleMass);
    const [speeds, angles] = [4000, 400];
    const from = Math.sqrt(hydrogen.escapeParameter);
    let sum = 0;
    for (let i = 0; i < speeds; i += 1) {
      const u = from + (6 * (i + 0.5)) / speeds;
      for (let j = 0; j < angles; j += 1) {
        const cosine = (j + 0.5) / angles;
        sum += u ** 3 * Math.exp(-u * u) * cosine * (6 / speeds / angles);
      }
    }
    const expected = (hydrogen.numberDensity * scale * 2 * Math.PI * sum) / Math.PI ** 1.5;
    expect(jeansFlux(hydrogen)).toBeCloseToRelative(expected, 1e-5);
  });

  it("tends to n v̄/4 where nothing is bound", () => {
    const meanSpeed = Math.sqrt((8 * boltzmann.value * 1000) / (Math.PI * particleMass));
    const flux = jeansFlux({ ...hydrogen, escapeParameter: 0 });
    expect(flux).toBeCloseToRelative((8e10 * meanSpeed) / 4, 1e-14);
  });

  it("is in proportion to the density", () => {
    const density = fc.double({ min: 0, max: 1e25, noNaN: true });
    fc.assert(
      fc.property(density, (numberDensity) => {
        const flux = jeansFlux({ ...hydrogen, numberDensity });
        return flux === numberDensity * effusionVelocity(hydrogen);
      }),
      { seed },
    );
  });

  it.each([-1, NaN, Infinity])("refuses a density of %s", (numberDensity) => {
    expect(() => jeansFlux({ ...hydrogen, numberDensity })).toThrow(PhysicsDomainError);
    expect(() => log10JeansFlux({ ...hydrogen, numberDensity })).toThrow(PhysicsDomainError);
  });

  it.each([0, -1, NaN, Infinity])("refuses a temperature of %s K", (temperature) => {
    expect(() => jeansFlux({ ...hydrogen, temperature })).toThrow(PhysicsDomainError);
    expect(() => log10JeansFlux({ ...hydrogen, temperature })).toThrow(PhysicsDomainError);
  });
});

describe("log10JeansFlux", () => {
  it("is the logarithm of the flux", () => {
    const density = fc.double({ min: 1e-5, max: 1e25, noNaN: true });
    const lambda = fc.double({ min: 0, max: 500, noNaN: true });
    fc.assert(
      fc.property(density, lambda, (numberDensity, escapeParameter) => {
        const gas = { ...hydrogen, numberDensity, escapeParameter };
        return Math.abs(log10JeansFlux(gas) - Math.log10(jeansFlux(gas))) < 1e-13;
      }),
      { seed },
    );
  });

  it("of Mars in 1969 is 12.244", () => {
    expect(log10JeansFlux(atMars(350, 3e10))).toAgreeWith({
      what: "log₁₀ of the Jeans flux of H from Mars in 1969",
      unit: "1",
      published: Math.log10(1.753e12),
      within: { absolute: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("carries what no number holds: a λ of 2000", () => {
    const flux = log10JeansFlux({ ...hydrogen, escapeParameter: 2000 });
    // By hand: log10 8e10 = 10.90309; v_p/2√π = 1145.86 m/s, log10 3.05913; log10 2001 = 3.30125; 868.58896.
    expect(flux).toAgreeWith({
      what: "log₁₀ of the Jeans flux of 8e10 m⁻³ of H at λ = 2000, 1000 K",
      unit: "1",
      published: 10.90309 + 3.05913 + 3.30125 - 868.58896,
      within: { absolute: 5e-5 },
      source: "Arithmetic",
      mark: "computed independently",
    });
  });

  it("refuses a density of zero, which has no logarithm", () => {
    expect(() => log10JeansFlux({ ...hydrogen, numberDensity: 0 })).toThrow(PhysicsDomainError);
  });
});

describe("jeansRate", () => {
  it("of 3 kg/s of H is the Earth's 3.514e8 cm⁻² s⁻¹ at the surface", () => {
    // Catling and Zahnle (2009) give 3 kg/s; with the Earth's mean radius.
    const surface = 6371008.4;
    const flux = jeansFlux(hydrogen);
    const massRate = jeansRate({ ...hydrogen, radius: surface }) * particleMass;
    expect((flux * 3) / massRate).toAgreeWith({
      what: "surface flux of 3 kg/s of H from the Earth",
      unit: "m⁻² s⁻¹",
      published: 3.514e12,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of 2e10 cm⁻² s⁻¹ at Titan's surface is 1.666e28 s⁻¹", () => {
    // Strobel (2010) gives the flux; with a radius of 2574.73 km.
    const ratio = jeansRate({ ...hydrogen, radius: 2574730 }) / jeansFlux(hydrogen);
    expect(ratio * 2e14).toAgreeWith({
      what: "rate of 2e10 H2 cm⁻² s⁻¹ at Titan's surface",
      unit: "s⁻¹",
      published: 1.666e28,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("sums the flux over the sphere, band by band", () => {
    const [radius, bands] = [7e6, 2000];
    let area = 0;
    for (let i = 0; i < bands; i += 1) {
      const latitude = -Math.PI / 2 + (Math.PI * (i + 0.5)) / bands;
      area += 2 * Math.PI * radius * Math.cos(latitude) * ((radius * Math.PI) / bands);
    }
    expect(jeansRate({ ...hydrogen, radius })).toBeCloseToRelative(area * jeansFlux(hydrogen), 1e-6);
  });

  it("grows with the square of the radius, and vanishes with it", () => {
    const size = fc.double({ min: 1, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(size, (radius) => {
        return jeansRate({ ...hydrogen, radius: 2 * radius }) === 4 * jeansRate({ ...hydrogen, radius });
      }),
      { seed },
    );
    expect(jeansRate({ ...hydrogen, radius: 1e-20 })).toBeLessThan(1e-25);
  });

  it.each([0, -1, NaN, Infinity])("refuses a radius of %s m", (radius) => {
    expect(() => jeansRate({ ...hydrogen, radius })).toThrow(PhysicsDomainError);
  });
});
