import { describe, expect, it } from "vitest";

import { atomicMass, boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { collisionParameter } from "../../../../shared/physics/handbook/collisionParameter";
import { collisionRows } from "../../../../shared/physics/handbook/collisionRows";
import { findGas, handbookGases } from "../../../../shared/physics/handbook/handbookGases";
import published from "../../../fixtures/collisionParameters.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

function gas(formula: string) {
  const found = findGas(formula);
  if (!found) throw new Error(`no ${formula} in the handbook`);
  return found;
}

const ofPair = (pair: string) => {
  const [first, second] = pair.split("-");
  return collisionParameter(gas(first), gas(second));
};

describe("collisionParameter", () => {
  it.each(Object.entries(published.evaluated))("takes the first published law of %s", (pair, values) => {
    // Fixture: evaluated by a separate program from the laws of Mason and Marrero (1970) and later compilations.
    const { coefficient, exponent, isEstimate } = ofPair(pair);
    expect(isEstimate).toBe(false);
    for (const [temperature, perCentimetre] of Object.entries(values)) {
      expect(coefficient * Number(temperature) ** exponent).toAgreeWith({
        what: "first published law b(T) of each pair",
        unit: "m⁻¹ s⁻¹",
        published: perCentimetre * 100,
        within: { relative: 1e-9 },
        source: "MasonMarrero1970",
        mark: "computed independently",
      });
    }
  });

  it.each(Object.entries(published.estimates))(
    "reproduces the estimate of Banks and Kockarts for %s",
    (pair, value) => {
      const [first, second] = pair.split("-") as (keyof typeof published.massesU)[];
      const unlisted = (formula: keyof typeof published.massesU) => ({
        formula: `${formula}*`,
        mass: published.massesU[formula] * atomicMass.value,
      });
      const estimate = collisionParameter(unlisted(first), unlisted(second));
      // The fixture does not state its masses to the last digit: 1 part in 10⁵.
      expect(estimate.coefficient).toAgreeWith({
        what: "estimate b(1 K) of pairs without a measured law",
        unit: "m⁻¹ s⁻¹",
        published: value * 100,
        within: { relative: 1e-5 },
        source: "BanksKockarts1973",
        mark: "computed independently",
      });
      expect(estimate).toMatchObject({ exponent: 0.5, source: "BanksKockarts1973", isEstimate: true });
    },
  );

  it("takes Hunten's law of H in CO2", () => {
    // Hunten (1973) table 1, read in later works: 8.4e17 T^0.597 cm⁻¹ s⁻¹.
    expect(ofPair("H-CO2")).toEqual({
      coefficient: 8.4e19,
      exponent: 0.597,
      source: "Hunten1973",
      isEstimate: false,
    });
  });

  it("estimates by rigid spheres of 3 Å", () => {
    // Chapman-Enskog, first order: b = 3/(8 d²) √(kT/2πμ); the printed 1.52e18 is rounded to 0.3 %.
    const [first, second] = [gas("O"), gas("CO2")];
    const reduced = (first.mass * second.mass) / (first.mass + second.mass);
    const spheres = (3 / (8 * 3e-10 ** 2)) * Math.sqrt(boltzmann.value / (2 * Math.PI * reduced));
    expect(collisionParameter(first, second).coefficient).toBeCloseToRelative(spheres, 0.004);
  });

  it("gives the diffusion coefficient of the CRC table", () => {
    const { coefficient, exponent } = ofPair("Ar-N2");
    const diffusion = (coefficient * 293.15 ** exponent * boltzmann.value * 293.15) / 101325;
    expect(diffusion).toAgreeWith({
      what: "D of Ar in N2 at 293.15 K and 101,325 Pa",
      unit: "m² s⁻¹",
      published: 0.19e-4,
      within: { relative: 0.01 },
      source: "CRCDiffusion",
      mark: "published",
    });
  });

  it("does not mind the order of the two gases", () => {
    for (const first of handbookGases) {
      for (const second of handbookGases) {
        expect(collisionParameter(first, second)).toEqual(collisionParameter(second, first));
      }
    }
  });

  it("falls back on the estimate for pairs of which only guesses or lumped laws are published", () => {
    for (const pair of ["D-CO2", "HD-CO2", "D-H2", "O-CO2", "N2-CO2", "Ar-CO2", "H-D"]) {
      expect(ofPair(pair).isEstimate, pair).toBe(true);
    }
  });

  it("weighs a stated mass in the estimate", () => {
    const light = collisionParameter({ formula: "X", mass: 1e-26 }, { formula: "Y", mass: 1e-26 });
    const heavy = collisionParameter({ formula: "X", mass: 4e-26 }, { formula: "Y", mass: 4e-26 });
    expect(light.coefficient).toBeCloseToRelative(2 * heavy.coefficient, 1e-14);
  });

  it.each([0, -1, NaN, Infinity])("refuses a mass of %s kg", (mass) => {
    expect(() => collisionParameter({ formula: "X", mass }, gas("N2"))).toThrow(PhysicsDomainError);
  });
});

describe("collisionRows", () => {
  it("are laws of a plausible size", () => {
    for (const { gases, coefficient, exponent } of collisionRows) {
      // b at 300 K lies between those of two heavy molecules and of H in He.
      const b = coefficient * 300 ** exponent;
      expect(b, gases.join("-")).toBeGreaterThan(3e20);
      expect(b, gases.join("-")).toBeLessThan(8e21);
      expect(exponent).toBeGreaterThanOrEqual(0.5);
      expect(exponent).toBeLessThan(0.9);
    }
  });

  it("of one pair agree within a factor of two", () => {
    const byPair = new Map<string, number[]>();
    for (const { gases, coefficient, exponent } of collisionRows) {
      const pair = [...gases].sort().join("-");
      byPair.set(pair, [...(byPair.get(pair) ?? []), coefficient * 300 ** exponent]);
    }
    for (const [pair, values] of byPair)
      expect(Math.max(...values) / Math.min(...values), pair).toBeLessThan(2);
  });

  it("keep Hunten's law for other gases in CO2 as his guess, which no pair takes by default", () => {
    const other = collisionRows.find(({ gases }) => gases[0] === "other");
    expect(other).toMatchObject({ coefficient: 1e19, exponent: 0.75, basis: "estimated" });
  });
});
