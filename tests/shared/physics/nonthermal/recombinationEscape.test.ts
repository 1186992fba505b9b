import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findBody } from "../../../../shared/physics/handbook/handbookBodies";
import { findRecombiningIon, recombiningIons } from "../../../../shared/physics/handbook/recombination";
import { recombinationCoefficient } from "../../../../shared/physics/nonthermal/recombinationCoefficient";
import {
  type Ionosphere,
  recombinationEscape,
} from "../../../../shared/physics/nonthermal/recombinationEscape";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const o2 = findRecombiningIon("O2+")!;
const mars = findBody("Mars")!;
const exobaseRadius = mars.radius + 200e3;
const radiiFrom = (from: number, to: number, count: number): number[] =>
  Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));

/** Ions and electrons that fall off exponentially, electrons at one temperature. */
function ionosphere({
  from = exobaseRadius,
  to = exobaseRadius + 600e3,
  count = 13,
  temperature = 1000,
} = {}): Ionosphere {
  const radii = radiiFrom(from, to, count);
  const fall = (scale: number) => radii.map((r) => 1e10 * Math.exp(-(r - exobaseRadius) / scale));
  return {
    ions: { radii, numberDensities: fall(30e3) },
    electrons: { radii, numberDensities: fall(60e3), temperatures: radii.map(() => temperature) },
  };
}

const source = {
  ion: o2,
  gravitationalParameter: mars.gravitationalParameter,
  exobaseRadius,
  ionosphere: ionosphere(),
};

describe("recombinationCoefficient", () => {
  it.each([
    // cm³ s⁻¹ at 300 K, and O2+ at 1200 and 3000 K: the sources of each row in the handbook, by hand.
    ["O2+", 300, 1.953e-7],
    ["O2+", 1200, 1.953e-7 * 0.25 ** 0.7],
    ["O2+", 3000, 7.389e-8 * 0.4 ** 0.56],
    ["CO+", 300, 2.75e-7],
    ["N2+", 300, 2.2e-7],
    ["NO+", 300, 4.0e-7],
    ["CO2+", 300, 3.5e-7],
    ["CO2+", 1200, 1.75e-7],
  ])("of %s at %s K is %s cm³ s⁻¹", (formula, temperature, alphaCm3) => {
    const alpha = recombinationCoefficient(findRecombiningIon(formula)!, temperature);
    expect(alpha * 1e6).toAgreeWith({
      what: `recombination coefficient of ${formula} at ${temperature} K`,
      unit: "cm³ s⁻¹",
      published: alphaCm3,
      within: { relative: 1e-14 },
      source: findRecombiningIon(formula)!.rate.provenance.source,
      mark: "computed independently",
    });
  });

  it("of O2+ is near the 2.0e-7 and 2.4e-7 of others at 300 K, and its pieces nearly meet", () => {
    expect(recombinationCoefficient(o2, 300) * 1e6).toAgreeWith({
      what: "recombination coefficient of O2+ at 300 K, between 2.0e-7 of others and Peverall's 2.4e-7",
      unit: "cm³ s⁻¹",
      published: 2.2e-7,
      within: { relative: 0.15 },
      source: "Peverall2001",
      mark: "published",
    });
    const [below, above] = [recombinationCoefficient(o2, 1200), recombinationCoefficient(o2, 1200.001)];
    expect(below).toBeCloseToRelative(above, 2e-3);
  });

  it("of every ion vanishes in the heat and falls as electrons speed up", () => {
    for (const ion of recombiningIons) expect(recombinationCoefficient(ion, 1e30)).toBeLessThan(1e-22);
    const temperature = fc.double({ min: 10, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(temperature, fc.constantFrom(...recombiningIons), (t, ion) => {
        return recombinationCoefficient(ion, t * 1.01) < recombinationCoefficient(ion, t);
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses electrons of %s K", (temperature) => {
    expect(() => recombinationCoefficient(o2, temperature)).toThrow(PhysicsDomainError);
  });
});

describe("recombinationEscape", () => {
  it("of exponential profiles is what they integrate to by hand", () => {
    // α n_i n_e over a scale height of 1/(1/30 + 1/60) = 20 km, cut after 600 km.
    const column = recombinationCoefficient(o2, 1000) * 1e20 * 20e3 * (1 - Math.exp(-30));
    const { columnRate, rate, rates } = recombinationEscape(source);
    expect(columnRate).toBeCloseToRelative(column, 1e-11);
    expect(rate).toBeCloseToRelative(4 * Math.PI * exobaseRadius ** 2 * 0.5 * columnRate * 2 * 0.64, 1e-12);
    expect(rates).toEqual({ O: rate });
  });

  it("adds up thin shells where temperature varies too", () => {
    const radii = radiiFrom(exobaseRadius, exobaseRadius + 400e3, 801);
    const densities = radii.map((r) => 2e10 * Math.exp(-(r - exobaseRadius) / 50e3));
    const temperatures = radii.map((r) => 600 + (1500 * (r - exobaseRadius)) / 400e3);
    const varied = {
      ions: { radii, numberDensities: densities },
      electrons: { radii, numberDensities: densities, temperatures },
    };
    // The trapezoidal rule over 0.5 km on a fall over 25 km is itself 3e-5 too large.
    let sum = 0;
    for (let i = 1; i < radii.length; i += 1) {
      const pair = [i - 1, i].map((k) => recombinationCoefficient(o2, temperatures[k]) * densities[k] ** 2);
      sum += 0.5 * (pair[0] + pair[1]) * (radii[i] - radii[i - 1]);
    }
    expect(recombinationEscape({ ...source, ionosphere: varied }).columnRate).toBeCloseToRelative(sum, 5e-5);
  });

  it("of an ionosphere like that of Mars is of the order of the rates inferred there", () => {
    // 1.2e25 to 5.5e25 O/s over the whole planet. By day some 1e4 cm⁻³ at 200 km, T_e 2000 K
    // (order of magnitude, from memory), here all around.
    const rate =
      recombinationEscape({ ...source, ionosphere: ionosphere({ temperature: 2000 }) }).rate ?? NaN;
    expect(rate).toAgreeWith({
      what: "hot O from an ionosphere like that of Mars, to a factor 10 of 1.2e25 to 5.5e25",
      unit: "s⁻¹",
      within: { range: [1.2e25 / 10, 5.5e25 * 10] },
      source: "Lillis2017",
      mark: "published",
    });
  });

  it("begins at the exobase and leaves out what lies under it", () => {
    const deep = recombinationEscape({
      ...source,
      ionosphere: ionosphere({ from: exobaseRadius - 200e3, count: 401 }),
    });
    expect(deep.from).toBe(exobaseRadius);
    expect(deep.notes).toEqual([]);
    expect(deep.columnRate).toBeCloseToRelative(recombinationEscape(source).columnRate, 1e-11);
  });

  it("says what is missing where profiles begin too high, and ends with the shorter one", () => {
    const high = { ...ionosphere({ from: exobaseRadius + 12e3 }) };
    const { from, to, notes } = recombinationEscape({
      ...source,
      ionosphere: { ions: ionosphere({ to: exobaseRadius + 300e3 }).ions, electrons: high.electrons },
    });
    expect(from).toBeCloseToRelative(exobaseRadius + 12e3, 1e-15);
    expect(to).toBeCloseToRelative(exobaseRadius + 300e3, 1e-15);
    expect(notes).toHaveLength(1);
    expect(notes[0]).toMatchObject({ level: "caution", code: "profile_begins_above_exobase" });
    expect(notes[0].message).toContain("12.0 km");
  });

  it("has no rate where branchings are unknown, until they are given", () => {
    const co2 = { ...source, ion: findRecombiningIon("CO2+")! };
    const unknown = recombinationEscape(co2);
    expect(unknown).toMatchObject({ rate: null, rates: null });
    expect(unknown.columnRate).toBeGreaterThan(0);
    expect(unknown.notes.map(({ code }) => code)).toEqual(["branching_unknown"]);
    const given = recombinationEscape({ ...co2, branchings: [1, 0, 0, 0] });
    expect(given.rates).toEqual({ CO: 0, O: given.rate });
    expect(given.notes).toEqual([]);
  });

  it("goes with both densities, and vanishes with them", () => {
    const factor = fc.double({ min: 1e-8, max: 1e4, noNaN: true });
    const { ions, electrons } = source.ionosphere;
    const one = recombinationEscape(source).columnRate;
    fc.assert(
      fc.property(factor, factor, (f, g) => {
        const changed = {
          ions: { ...ions, numberDensities: Array.from(ions.numberDensities, (n) => n * f) },
          electrons: { ...electrons, numberDensities: Array.from(electrons.numberDensities, (n) => n * g) },
        };
        const { columnRate } = recombinationEscape({ ...source, ionosphere: changed });
        return Math.abs(columnRate / (one * f * g) - 1) < 1e-11;
      }),
      { seed, numRuns: 20 },
    );
  });

  it.each<[string, Partial<Ionosphere>]>([
    ["ions of no density", { ions: { radii: [3.5e6, 4e6], numberDensities: [1e9, 0] } }],
    ["profiles under the exobase", { ions: { radii: [3.4e6, 3.5e6], numberDensities: [1e9, 1e9] } }],
    ["radii that fall", { ions: { radii: [4e6, 3.5e6], numberDensities: [1e9, 1e9] } }],
    ["columns of unequal length", { ions: { radii: [3.5e6, 4e6], numberDensities: [1e9] } }],
    [
      "electrons of 0 K",
      { electrons: { radii: [3.5e6, 4e6], numberDensities: [1e9, 1e9], temperatures: [0, 1000] } },
    ],
  ])("refuses %s", (_, wrong) => {
    const given = { ...source, ionosphere: { ...source.ionosphere, ...wrong } };
    expect(() => recombinationEscape(given)).toThrow(PhysicsDomainError);
  });

  it("refuses an exobase of no radius", () => {
    expect(() => recombinationEscape({ ...source, exobaseRadius: 0 })).toThrow(PhysicsDomainError);
  });
});
