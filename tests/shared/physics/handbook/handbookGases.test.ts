import { describe, expect, it } from "vitest";

import { atomicMass, avogadro } from "../../../../shared/physics/constants/codata2022";
import { findGas, handbookGases } from "../../../../shared/physics/handbook/handbookGases";
import "../../../toAgreeWith";
import type { Mark } from "../../../validation/agreement";
import "../../../toBeCloseToRelative";

function gas(formula: string) {
  const found = findGas(formula);
  if (!found) throw new Error(`no ${formula} in the handbook`);
  return found;
}

describe("handbookGases", () => {
  it("know the gases of upper atmospheres", () => {
    const needed = "H H2 D HD He C N O Ne Ar CO N2 O2 NO CO2 CH4 H2O OH NH3 Kr Xe SO2".split(" ");
    expect(handbookGases.map(({ formula }) => formula).sort()).toEqual(needed.sort());
    expect(new Set(handbookGases.map(({ name }) => name)).size).toBe(needed.length);
  });

  it.each<[formula: string, massU: number, source?: string, mark?: Mark]>([
    // H and D: isotopes ¹H and ²H; the others: sums of conventional atomic weights, with the isotope for H in compounds.
    ["H", 1.00782503223, "Wang2012"],
    ["D", 2.01410177812, "Wang2012"],
    ["H2", 2.01565006446, "Wang2012"],
    ["HD", 3.02192681035, "Wang2012"],
    ["He", 4.002602],
    ["CH4", 16.04230012892],
    ["H2O", 18.01465006446],
    ["N2", 28.014],
    ["O2", 31.998],
    ["Ar", 39.95, "Prohaska2022", "from memory"],
    ["CO2", 44.009],
    ["SO2", 64.058],
  ])("give %s a mass of %s u", (formula, massU, source = "Meija2016", mark = "published") => {
    expect(gas(formula).molarMassU).toAgreeWith({
      what: "masses of the handbook's gases",
      unit: "u",
      published: massU,
      within: { relative: 1e-14 },
      source,
      mark,
    });
    expect(gas(formula).mass).toBeCloseToRelative(massU * atomicMass.value, 1e-14);
  });

  it.each([
    // Molar masses of the U.S. Standard Atmosphere 1976, kg/kmol; older atomic weights, so 1 part in 10⁴.
    ["N2", 28.0134],
    ["O2", 31.9988],
    ["O", 15.9994],
    ["Ar", 39.948],
    ["He", 4.0026],
  ])("agree with the 1976 standard on %s", (formula, molarMass) => {
    expect(gas(formula).mass * avogadro.value * 1e3).toAgreeWith({
      what: `molar mass of ${formula}, by older atomic weights`,
      unit: "kg kmol⁻¹",
      published: molarMass,
      within: { relative: 1e-4 },
      source: "USSA1976",
      mark: "published",
    });
  });

  it.each([
    // Å; GRI-Mech 3.0 transport data. He, Ne, Kr, Xe, SO2: Poling, Prausnitz and O'Connell (2001), Appendix B.
    ["H", 2.05],
    ["D", 2.05],
    ["H2", 2.92],
    ["HD", 2.92],
    ["He", 2.551],
    ["C", 3.298],
    ["N", 3.298],
    ["O", 2.75],
    ["OH", 2.75],
    ["Ne", 2.82],
    ["Ar", 3.33],
    ["CO", 3.65],
    ["N2", 3.621],
    ["O2", 3.458],
    ["NO", 3.621],
    ["CO2", 3.763],
    ["CH4", 3.746],
    ["H2O", 2.605],
    ["NH3", 2.92],
    ["Kr", 3.655],
    ["Xe", 4.047],
    ["SO2", 4.112],
  ])("give %s a collision diameter of %s Å", (formula, diameterAngstrom) => {
    expect(gas(formula).collisionDiameter * 1e10).toAgreeWith({
      what: "collision diameters of the handbook's gases",
      unit: "Å",
      published: diameterAngstrom,
      within: { relative: 1e-14 },
      source: ["He", "Ne", "Kr", "Xe", "SO2"].includes(formula) ? "Poling2001" : "GRIMech3",
      mark: "published",
    });
  });

  it("take thermal diffusion from the 1976 standard", () => {
    // U.S. Standard Atmosphere 1976: −0.25 for H, −0.40 for He, 0 for N2, O, O2 and Ar.
    const factors = Object.fromEntries(
      handbookGases
        .filter((g) => g.thermalDiffusionFactor !== 0)
        .map((g) => [g.formula, g.thermalDiffusionFactor]),
    );
    expect(factors).toEqual({ H: -0.25, D: -0.25, H2: -0.25, HD: -0.25, He: -0.4 });
  });

  it("say where each number comes from", () => {
    for (const { formula, sources } of handbookGases) {
      expect(sources.mass.length, formula).toBeGreaterThan(0);
      expect(sources.collisionDiameter.source, formula).toMatch(/GRIMech3|Poling2001/);
      expect(sources.thermalDiffusionFactor.source, formula).toBe("USSA1976");
    }
    expect(gas("D").sources.collisionDiameter.mark).toBe("by analogy");
    expect(gas("Ar").sources.mass[0].mark).toBe("from memory");
  });

  it("answer undefined for what they do not hold", () => {
    expect(findGas("h2o")).toBeUndefined();
    expect(findGas("constructor")).toBeUndefined();
  });
});
