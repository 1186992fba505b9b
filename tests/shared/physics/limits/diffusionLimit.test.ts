import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { atomicMass, boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { diffusionLimit } from "../../../../shared/physics/limits/diffusionLimit";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

/** A light gas at the Earth's homopause; b = n D in cm⁻¹ s⁻¹, and no step to the exobase. */
function place({ massU = 2.016, bCm = 1.462e19, moleFraction = 1, ...given } = {}) {
  return {
    numberDensity: 1e19,
    temperature: 208,
    temperatureGradient: 0,
    gravity: 9.5,
    moleFraction,
    particleMass: massU * atomicMass.value,
    // The mean mass whose scale height at 208 K and 9.5 m/s² is 6.284 km, as stated with the numbers below.
    othersMass: (boltzmann.value * 208) / (9.5 * 6284),
    diffusionCoefficient: (bCm * 100) / 1e19,
    thermalDiffusionFactor: 0,
    radius: 6.47e6,
    exobaseRadius: 6.47e6,
    ...given,
  };
}

const fluxOf = (of: ReturnType<typeof place>): number => {
  const limit = diffusionLimit(of);
  return limit.exists ? limit.flux : NaN;
};

describe("diffusionLimit", () => {
  it.each([
    // From these b, 208 K, 9.5 m/s² and H_a = 6.284 km, in cm⁻² s⁻¹ for a mixing ratio of 1.
    ["H2", 2.016, 1.462e19, 2.165e13],
    ["H", 1.008, 2.726e19, 4.187e13],
  ])("of %s at the Earth's homopause is the one computed independently", (formula, massU, bCm, fluxCm) => {
    expect(fluxOf(place({ massU, bCm }))).toAgreeWith({
      what: `diffusion limit over X of ${formula} at the Earth's homopause`,
      unit: "m⁻² s⁻¹",
      published: fluxCm * 1e4,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("brackets the constant 2.5e13 cm⁻² s⁻¹ that is used for all hydrogen at the Earth", () => {
    // H2 lies below it, H above.
    const constant = { source: "Hunten1973", mark: "from memory", unit: "m⁻² s⁻¹" } as const;
    expect(fluxOf(place())).toAgreeWith({
      ...constant,
      what: "diffusion limit over X of H2 at the Earth, below the constant of all hydrogen",
      within: { range: [0, 2.5e17] },
    });
    expect(fluxOf(place({ massU: 1.008, bCm: 2.726e19 }))).toAgreeWith({
      ...constant,
      what: "diffusion limit over X of H at the Earth, above the constant of all hydrogen",
      within: { range: [2.5e17, Infinity] },
    });
  });

  it("is the flux that just uses up a light gas with height", () => {
    // dX/dz = X (m_a − m) g/kT − φ/(n D) for a trace gas: with φ at the limit X stays as it is; above it falls to 0.
    const of = place({ moleFraction: 1e-6 });
    const limit = fluxOf(of);
    const walk = (share: number) => {
      let fraction = of.moleFraction;
      const step = 10;
      for (let z = 0; z < 60e3; z += step) {
        const density = of.numberDensity * Math.exp(-z / 6284);
        const nd = (of.diffusionCoefficient * of.numberDensity * density) / density;
        const lift = ((of.othersMass - of.particleMass) * of.gravity) / (boltzmann.value * of.temperature);
        fraction += step * (fraction * lift - (share * limit) / nd);
      }
      return fraction;
    };
    expect(walk(1)).toBeCloseToRelative(of.moleFraction, 1e-9);
    expect(walk(1.05)).toBeLessThan(0);
    expect(walk(0.95)).toBeGreaterThan(of.moleFraction);
  });

  it("vanishes with the gas and as the masses draw level", () => {
    expect(fluxOf(place({ moleFraction: 0 }))).toBe(0);
    const { othersMass } = place();
    const nearly = fluxOf({ ...place(), particleMass: othersMass * (1 - 1e-9) });
    expect(nearly / fluxOf(place())).toBeLessThan(2e-9);
  });

  it("is left out for a gas that is not lighter, or that thermal diffusion holds back", () => {
    const { othersMass } = place();
    expect(diffusionLimit({ ...place(), particleMass: othersMass })).toEqual({
      exists: false,
      reason: "not_lighter",
    });
    const held = { ...place(), thermalDiffusionFactor: 0.4, temperatureGradient: 0.1 };
    expect(diffusionLimit(held)).toEqual({ exists: false, reason: "held_by_thermal_diffusion" });
  });

  it("grows where thermal diffusion drives the gas up a rising temperature", () => {
    // −α T′/T = 0.25 × 0.01/208 = 1.202e-5 m⁻¹ beside (m_a − m) g/kT = 1/6284 m − 2.016 u g/kT = 1.4806e-4 m⁻¹.
    const driven = { ...place(), thermalDiffusionFactor: -0.25, temperatureGradient: 0.01 };
    expect(fluxOf(driven) / fluxOf(place())).toBeCloseToRelative(1 + 1.202e-5 / 1.4806e-4, 1e-4);
  });

  it("is in proportion to the mixing ratio, and refers to the area of the exobase", () => {
    const fraction = fc.double({ min: 1e-12, max: 1, noNaN: true });
    const spread = fc.double({ min: 0.5, max: 3, noNaN: true });
    fc.assert(
      fc.property(fraction, spread, (moleFraction, factor) => {
        const flux = fluxOf({ ...place({ moleFraction }), exobaseRadius: 6.47e6 * factor });
        return Math.abs(flux / ((fluxOf(place()) * moleFraction) / factor ** 2) - 1) < 1e-14;
      }),
      { seed },
    );
  });

  it.each([
    { numberDensity: 0 },
    { temperature: 0 },
    { temperatureGradient: NaN },
    { gravity: -1 },
    { moleFraction: 1.1 },
    { particleMass: 0 },
    { othersMass: NaN },
    { diffusionCoefficient: 0 },
    { thermalDiffusionFactor: Infinity },
    { radius: 0 },
    { exobaseRadius: 0 },
  ])("refuses %o", (wrong) => {
    expect(() => diffusionLimit({ ...place(), ...wrong })).toThrow(PhysicsDomainError);
  });
});
