import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { hillRadius } from "../../../../shared/physics/body/hillRadius";
import { tidalFactor } from "../../../../shared/physics/body/tidalFactor";
import {
  astronomicalUnit,
  nominalJupiterGravitationalParameter,
  nominalJupiterRadius,
  nominalSolarGravitationalParameter,
} from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findBody } from "../../../../shared/physics/handbook/handbookBodies";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { energyLimitedMassRate } from "../../../../shared/physics/limits/energyLimitedMassRate";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const { gravitationalParameter = NaN, radius = NaN } = findBody("Earth") ?? {};
const earth = {
  heatingEfficiency: 0.15,
  xuvFlux: 4.64e-3,
  xuvRadius: radius,
  radius,
  gravitationalParameter,
  tidalFactor: 1,
};

describe("energyLimitedMassRate", () => {
  it("of the Earth in 4.64 mW/m² is 1418.55 kg/s", () => {
    expect(energyLimitedMassRate(earth)).toAgreeWith({
      what: "energy-limited rate of the Earth in 4.64 mW/m², ε = 0.15, R_XUV = R",
      unit: "kg s⁻¹",
      published: 1418.55,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it.each([
    // In cm⁻² s⁻¹ of H over the surface, for 100 times 4.64 mW/m² at 1 au.
    ["Earth", 1, 1.66183e13],
    ["Mars", 1.523679, 3.5443e13],
    ["Venus", 0.723332, 3.7019e13],
  ])("of a young %s at %s au is %s H cm⁻² s⁻¹", (name, distance, fluxCm) => {
    const body = findBody(name)!;
    const rate = energyLimitedMassRate({
      ...earth,
      ...body,
      xuvRadius: body.radius,
      xuvFlux: 0.464 / distance ** 2,
    });
    const flux = rate / (4 * Math.PI * body.radius ** 2 * findGas("H")!.mass);
    expect(flux).toAgreeWith({
      what: `energy-limited H flux of ${name} at ${distance} au, in 100 times 4.64 mW/m² at 1 au`,
      unit: "m⁻² s⁻¹",
      published: fluxCm * 1e4,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of a hot close-in giant is 3.467e9 g/s", () => {
    // 0.682 Jupiter masses, 1.359 Jupiter radii, 0.04707 au from 1.119 solar masses,
    // 0.45 W/m², ε = 0.15, R_XUV = R; ξ = 4.1952 and K = 0.64921.
    const body = {
      gravitationalParameter: 0.682 * nominalJupiterGravitationalParameter.value,
      radius: 1.359 * nominalJupiterRadius.value,
    };
    const hill = hillRadius({
      ...body,
      starGravitationalParameter: 1.119 * nominalSolarGravitationalParameter.value,
      starDistance: 0.04707 * astronomicalUnit.value,
    });
    const factor = tidalFactor({ hillRadius: hill, xuvRadius: body.radius });
    expect(factor).toAgreeWith({
      what: "tidal factor of a close-in giant, ξ = 4.1952",
      unit: "1",
      published: 0.64921,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    const rate = energyLimitedMassRate({
      ...earth,
      ...body,
      xuvRadius: body.radius,
      xuvFlux: 0.45,
      tidalFactor: factor,
    });
    expect(rate).toAgreeWith({
      what: "energy-limited rate of a close-in giant in 0.45 W/m², ε = 0.15",
      unit: "kg s⁻¹",
      published: 3.467e6,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("spends the light that meets the disc on lifting the gas", () => {
    // Joules caught in a second over joules to lift a kilogram from R to far away, climbed in steps.
    let lift = 0;
    const parts = 20000;
    for (let i = 0; i < parts; i += 1) {
      const share = (i + 0.5) / parts; // r = R/share
      lift += (gravitationalParameter * (share / radius) ** 2 * radius) / (share * share) / parts;
    }
    const caught = 0.15 * 4.64e-3 * Math.PI * radius ** 2;
    expect(energyLimitedMassRate(earth)).toBeCloseToRelative(caught / lift, 1e-9);
  });

  it("is nothing in the dark, and grows without end towards the edge of the Hill sphere", () => {
    expect(energyLimitedMassRate({ ...earth, xuvFlux: 0 })).toBe(0);
    expect(energyLimitedMassRate({ ...earth, tidalFactor: 1e-9 })).toBeGreaterThan(1e12);
  });

  it("goes with light, efficiency, absorbing disc and radius, and against GM and K", () => {
    const factor = fc.double({ min: 0.05, max: 1, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const expected = energyLimitedMassRate(earth) * f;
        const rates = [
          energyLimitedMassRate({ ...earth, xuvFlux: 4.64e-3 * f }),
          energyLimitedMassRate({ ...earth, heatingEfficiency: 0.15 * f }),
          energyLimitedMassRate({ ...earth, xuvRadius: radius * Math.sqrt(f) }),
          energyLimitedMassRate({ ...earth, radius: radius * f }),
          energyLimitedMassRate({ ...earth, gravitationalParameter: gravitationalParameter / f }),
          energyLimitedMassRate({ ...earth, tidalFactor: f }) * f * f,
        ];
        return rates.every((rate) => Math.abs(rate / expected - 1) < 1e-14);
      }),
      { seed },
    );
  });

  it.each([
    { heatingEfficiency: -0.1 },
    { heatingEfficiency: 1.1 },
    { xuvFlux: -1 },
    { xuvRadius: 0 },
    { radius: NaN },
    { gravitationalParameter: 0 },
    { tidalFactor: 0 },
    { tidalFactor: 1.01 },
    { tidalFactor: NaN },
  ])("refuses %o", (wrong) => {
    expect(() => energyLimitedMassRate({ ...earth, ...wrong })).toThrow(PhysicsDomainError);
  });
});
