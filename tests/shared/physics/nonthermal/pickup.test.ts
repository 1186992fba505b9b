import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { atomicMass, elementaryCharge } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { pickupEnergy } from "../../../../shared/physics/nonthermal/pickupEnergy";
import { pickupGyroradius } from "../../../../shared/physics/nonthermal/pickupGyroradius";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const charge = elementaryCharge.value;
const ion = { mass: findGas("O")!.mass, charge, flowSpeed: 400e3, magneticField: 3e-9 };

const massOf = (formula: string): number =>
  formula === "H" ? 1.007276466621 * atomicMass.value : findGas(formula)!.mass;

/** Extent across the field, and largest kinetic energy, of an ion that starts at rest in crossed fields. */
function cycloid({ mass, flowSpeed, magneticField }: typeof ion) {
  const rate = (charge * magneticField) / mass;
  const [steps, turns] = [20000, 1];
  const dt = (2 * Math.PI * turns) / rate / steps;
  let [x, y, vx, vy] = [0, 0, 0, 0];
  let [extent, energy] = [0, 0];
  const push = (ux: number, uy: number) => [rate * uy, rate * (flowSpeed - ux)];
  for (let i = 0; i < steps; i += 1) {
    const [ax, ay] = push(vx, vy);
    const [mx, my] = [vx + 0.5 * dt * ax, vy + 0.5 * dt * ay];
    const [bx, by] = push(mx, my);
    x += dt * mx;
    y += dt * my;
    vx += dt * bx;
    vy += dt * by;
    extent = Math.max(extent, Math.abs(y));
    energy = Math.max(energy, 0.5 * mass * (vx * vx + vy * vy));
  }
  return { extent, energy, drift: x };
}

describe("pickupGyroradius", () => {
  it.each([
    // With masses of the neutral, of H+ that of the proton, km, at 400 km/s.
    ["O", 3, 22103],
    ["O", 5, 13262],
    ["O", 10, 6631],
    ["H", 3, 1392],
    ["CO2", 3, 60804],
  ])("of %s+ in %s nT is %s km", (formula, fieldNt, radiusKm) => {
    const given = { ...ion, mass: massOf(formula), magneticField: fieldNt * 1e-9 };
    expect(pickupGyroradius(given) / 1e3).toAgreeWith({
      what: `gyroradius of ${formula}+ at 400 km/s in ${fieldNt} nT`,
      unit: "km",
      published: radiusKm,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is half of how far an ion from rest swings across the flow", () => {
    expect(pickupGyroradius(ion)).toBeCloseToRelative(cycloid(ion).extent / 2, 1e-6);
  });

  it("shrinks to nothing in a strong field, and goes with the momentum", () => {
    expect(pickupGyroradius({ ...ion, magneticField: 1e20 })).toBeLessThan(1e-20);
    const factor = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const one = pickupGyroradius(ion);
        const radii = [
          pickupGyroradius({ ...ion, mass: ion.mass * f }),
          pickupGyroradius({ ...ion, flowSpeed: ion.flowSpeed * f }),
          pickupGyroradius({ ...ion, magneticField: ion.magneticField / f }),
          pickupGyroradius({ ...ion, charge: charge / f }),
        ];
        return radii.every((radius) => Math.abs(radius / (one * f) - 1) < 1e-14);
      }),
      { seed },
    );
  });

  it.each([{ mass: 0 }, { charge: 0 }, { flowSpeed: -1 }, { magneticField: 0 }, { magneticField: NaN }])(
    "refuses %o",
    (wrong) => {
      expect(() => pickupGyroradius({ ...ion, ...wrong })).toThrow(PhysicsDomainError);
    },
  );
});

describe("pickupEnergy", () => {
  it.each([
    // The same, keV, at 400 km/s.
    ["O", 53.05],
    ["H", 3.341],
    ["CO2", 145.9],
  ])("of %s+ is %s keV", (formula, energyKev) => {
    const energy = pickupEnergy({ mass: massOf(formula), flowSpeed: 400e3 });
    expect(energy / charge / 1e3).toAgreeWith({
      what: `largest pickup energy of ${formula}+ at 400 km/s`,
      unit: "keV",
      published: energyKev,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is the most that an ion from rest has on its way", () => {
    expect(pickupEnergy(ion)).toBeCloseToRelative(cycloid(ion).energy, 1e-6);
  });

  it("is nothing without a flow, and goes with the square of its speed", () => {
    expect(pickupEnergy({ ...ion, flowSpeed: 0 })).toBe(0);
    const factor = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const ratio = pickupEnergy({ ...ion, flowSpeed: 400e3 * f }) / pickupEnergy(ion);
        return Math.abs(ratio / (f * f) - 1) < 1e-14;
      }),
      { seed },
    );
  });

  it.each([{ mass: 0 }, { flowSpeed: -1 }, { flowSpeed: NaN }])("refuses %o", (wrong) => {
    expect(() => pickupEnergy({ ...ion, ...wrong })).toThrow(PhysicsDomainError);
  });
});
