import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { escapeSpeed } from "../../../../shared/physics/body/escapeSpeed";
import { elementaryCharge } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findBody } from "../../../../shared/physics/handbook/handbookBodies";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { findRecombiningIon } from "../../../../shared/physics/handbook/recombination";
import { escapeEnergy } from "../../../../shared/physics/nonthermal/escapeEnergy";
import { escapingFragments } from "../../../../shared/physics/nonthermal/escapingFragments";
import { fragmentEnergy } from "../../../../shared/physics/nonthermal/fragmentEnergy";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const eV = elementaryCharge.value;
const massOf = (formula: string): number => findGas(formula)!.mass;

function above(body: string, altitude: number) {
  const { gravitationalParameter, radius } = findBody(body)!;
  return { gravitationalParameter, radius: radius + altitude };
}

const positive = fc.double({ min: 1e-3, max: 1e3, noNaN: true });

describe("escapeEnergy", () => {
  it.each([
    // eV.
    ["Mars", 200e3, { O: 1.978, C: 1.484, N: 1.732, H: 0.1246, He: 0.495 }],
    ["Venus", 200e3, { O: 8.614, C: 6.463, N: 7.541, H: 0.5428, He: 2.156 }],
    ["Earth", 500e3, { O: 9.617, C: 7.215, N: 8.419, H: 0.606, He: 2.407 }],
  ])("above %s is the one computed independently", (body, altitude, energies) => {
    for (const [formula, energyEv] of Object.entries(energies)) {
      const energy = escapeEnergy({ ...above(body, altitude), particleMass: massOf(formula) });
      expect(energy / eV).toAgreeWith({
        what: `escape energy of ${formula} above ${body}, at ${altitude / 1e3} km`,
        unit: "eV",
        published: energyEv,
        within: { relative: 1e-3 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
    }
  });

  it("is the kinetic energy at the escape speed", () => {
    const place = above("Mars", 200e3);
    const energy = escapeEnergy({ ...place, particleMass: massOf("O") });
    expect(energy).toBeCloseToRelative(0.5 * massOf("O") * escapeSpeed(place) ** 2, 1e-14);
  });

  it("vanishes far away and goes with the mass", () => {
    const place = above("Mars", 200e3);
    expect(escapeEnergy({ ...place, radius: 1e40, particleMass: 1e-26 })).toBeLessThan(1e-50);
    fc.assert(
      fc.property(positive, (f) => {
        const ratio =
          escapeEnergy({ ...place, particleMass: 1e-26 * f }) /
          escapeEnergy({ ...place, particleMass: 1e-26 });
        return Math.abs(ratio / f - 1) < 1e-14;
      }),
      { seed },
    );
  });

  it.each([{ gravitationalParameter: 0 }, { radius: 0 }, { particleMass: NaN }])("refuses %o", (wrong) => {
    const place = { ...above("Mars", 0), particleMass: 1e-26 };
    expect(() => escapeEnergy({ ...place, ...wrong })).toThrow(PhysicsDomainError);
  });
});

describe("fragmentEnergy", () => {
  it.each([
    // O2+: half of the channel's energy, eV, and the speed, km/s.
    [6.99, 3.495, 6.493],
    [5.02, 2.51, 5.503],
    [3.06, 1.53, 4.296],
    [0.84, 0.42, 2.251],
  ])("of O from %s eV is %s eV, %s km/s", (totalEv, atomEv, speedKmS) => {
    const mass = massOf("O");
    const energy = fragmentEnergy({ energy: totalEv * eV, mass, otherMass: mass });
    expect(energy / eV).toAgreeWith({
      what: "energy of O from a channel of O2+, half of it",
      unit: "eV",
      published: atomEv,
      within: { relative: 1e-14 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(Math.sqrt((2 * energy) / mass) / 1e3).toAgreeWith({
      what: "speed of O from a channel of O2+",
      unit: "km s⁻¹",
      published: speedKmS,
      within: { relative: 2e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of two gives equal momenta and adds up", () => {
    fc.assert(
      fc.property(positive, positive, positive, (energy, mass, otherMass) => {
        const one = fragmentEnergy({ energy, mass, otherMass });
        const two = fragmentEnergy({ energy, mass: otherMass, otherMass: mass });
        const momenta = Math.sqrt(2 * one * mass) / Math.sqrt(2 * two * otherMass);
        return Math.abs((one + two) / energy - 1) < 1e-14 && Math.abs(momenta - 1) < 1e-13;
      }),
      { seed },
    );
  });

  it("of C from CO+ is 4/7 of it", () => {
    // 16/28 by mass numbers.
    expect(fragmentEnergy({ energy: 2.9, mass: massOf("C"), otherMass: massOf("O") })).toBeCloseToRelative(
      (2.9 * 16) / 28,
      1e-3,
    );
  });

  it("goes whole to a light one beside a heavy one", () => {
    expect(fragmentEnergy({ energy: 1, mass: 1e-20, otherMass: 1 })).toBe(1);
    expect(fragmentEnergy({ energy: 0, mass: 1, otherMass: 1 })).toBe(0);
  });

  it.each([{ energy: -1 }, { mass: 0 }, { otherMass: NaN }])("refuses %o", (wrong) => {
    expect(() => fragmentEnergy({ energy: 1, mass: 1, otherMass: 1, ...wrong })).toThrow(PhysicsDomainError);
  });
});

describe("escapingFragments", () => {
  const at = (body: string, altitude: number, formula: string) => {
    const { gravitationalParameter, radius } = above(body, altitude);
    return { ion: findRecombiningIon(formula)!, gravitationalParameter, exobaseRadius: radius };
  };
  const onMars = at("Mars", 200e3, "O2+");

  it("of O2+ above Mars are both atoms of the first two channels: 0.64 or 0.738 of recombinations", () => {
    const { channels, total, perRecombination } = escapingFragments(onMars);
    expect(channels.map(({ escaping }) => escaping)).toEqual([2, 2, 0, 0]);
    expect(total).toAgreeWith({
      what: "atoms that escape from Mars a recombination of O2+",
      unit: "1",
      published: 2 * 0.64,
      within: { relative: 1e-12 },
      source: "Kella1997",
      mark: "computed independently",
    });
    expect(perRecombination).toEqual({ O: total });
    const { branchings } = onMars.ion.otherBranchings[0];
    expect(escapingFragments({ ...onMars, branchings }).total).toAgreeWith({
      what: "atoms that escape from Mars a recombination of O2+",
      unit: "1",
      published: 2 * 0.738,
      within: { relative: 1e-12 },
      source: "Petrignani2005",
      mark: "computed independently",
    });
  });

  it.each(["Venus", "Earth"])("of O2+ above %s are none", (body) => {
    // The same: none exceeds the escape energy of O there.
    expect(escapingFragments(at(body, 200e3, "O2+")).total).toBe(0);
  });

  it("of CO+ above Mars are C of the first channel alone", () => {
    // 2.90 × 16/28 = 1.66 eV over 1.484 eV for C; 1.24 eV under 1.978 eV for O; 1.64 × 4/7 = 0.94 eV.
    const { channels, perRecombination } = escapingFragments(at("Mars", 200e3, "CO+"));
    expect(channels.map(({ escaping }) => escaping)).toEqual([1, 0, 0]);
    expect(perRecombination).toEqual({ C: 0.761, O: 0 });
  });

  it("of a body of no weight are all of them, and none of a heavy one", () => {
    expect(escapingFragments({ ...onMars, gravitationalParameter: 1 }).total).toBeCloseToRelative(2, 1e-12);
    expect(escapingFragments({ ...onMars, gravitationalParameter: 1e20 }).total).toBe(0);
  });

  it("have no sum where a branching is not known, but energies", () => {
    const place = at("Mars", 200e3, "CO2+");
    const answer = escapingFragments(place);
    expect(answer).toMatchObject({ perRecombination: null, total: null });
    // 8.31 eV: O takes 28/44 of it, CO the rest, under its 3.46 eV.
    expect(answer.channels[0].fragments.map(({ escapes }) => escapes)).toEqual([false, true]);
    expect(answer.channels[0].fragments[1].energy / eV).toBeCloseToRelative((8.31 * 28) / 44, 1e-3);
    expect(escapingFragments({ ...place, branchings: [0.5, 0.2, 0.2, 0.1] }).total).toBe(0.5);
  });

  it("are fewer as the body grows heavier, and never more than two", () => {
    const gm = fc.double({ min: 1e8, max: 1e16, noNaN: true });
    fc.assert(
      fc.property(gm, gm, fc.constantFrom("O2+", "CO+", "N2+", "NO+"), (a, b, formula) => {
        const ion = findRecombiningIon(formula)!;
        const [light, heavy] = a < b ? [a, b] : [b, a];
        const many =
          escapingFragments({ ion, gravitationalParameter: light, exobaseRadius: 3.6e6 }).total ?? NaN;
        const few =
          escapingFragments({ ion, gravitationalParameter: heavy, exobaseRadius: 3.6e6 }).total ?? NaN;
        return few <= many && many <= 2 + 1e-12;
      }),
      { seed },
    );
  });

  it.each([[[1]], [[0.5, 0.5, 0.5, 0]], [[-0.1, 0, 0, 0]], [[NaN, 0, 0, 0]]])(
    "refuse branchings of %o",
    (branchings) => {
      expect(() => escapingFragments({ ...onMars, branchings })).toThrow(PhysicsDomainError);
    },
  );

  it("refuse a product that the handbook has no mass of", () => {
    const strange = {
      ...onMars.ion,
      channels: [{ ...onMars.ion.channels[0], products: ["Q", "O"] as const }],
    };
    expect(() => escapingFragments({ ...onMars, ion: strange })).toThrow(/Q/);
  });
});
