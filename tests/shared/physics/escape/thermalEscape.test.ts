import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { effusionVelocity } from "../../../../shared/physics/escape/effusionVelocity";
import { jeansFlux } from "../../../../shared/physics/escape/jeansFlux";
import { jeansRate } from "../../../../shared/physics/escape/jeansRate";
import { log10JeansFlux } from "../../../../shared/physics/escape/log10JeansFlux";
import { thermalEscape, type ThermalEscapeInput } from "../../../../shared/physics/escape/thermalEscape";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { jeansCases } from "./jeansCases";

const seed = 20261201;

function gas(formula: string, numberDensity: number) {
  return { formula, mass: findGas(formula)?.mass ?? NaN, logNumberDensity: Math.log(numberDensity) };
}

/** The Earth at 500 km, 1000 K, about the densities of the 1976 standard. */
const earth: ThermalEscapeInput = {
  gravitationalParameter: 3.9860043550702266e14,
  radius: 6871008.4,
  temperature: 1000,
  meanMass: 14.3 * 1.66053906892e-27,
  hillRadius: 1.496e9,
  gases: [gas("H", 8e10), gas("He", 3.2e12), gas("O", 1.8e13), gas("CO2", 1)],
};

describe("thermalEscape", () => {
  it("gives each gas what the single functions give", () => {
    const { gases } = thermalEscape(earth);
    const densities = [8e10, 3.2e12, 1.8e13];
    densities.forEach((numberDensity, i) => {
      const { temperature, radius } = earth;
      const { escapeParameter, ...answer } = gases[i];
      const single = { numberDensity, temperature, particleMass: earth.gases[i].mass, escapeParameter };
      expect(answer.effusionVelocity).toBeCloseToRelative(effusionVelocity(single), 1e-12);
      expect(answer.jeansFlux).toBeCloseToRelative(jeansFlux(single), 1e-12);
      expect(answer.log10JeansFlux).toBeCloseToRelative(log10JeansFlux(single), 1e-13);
      expect(answer.rate).toBeCloseToRelative(jeansRate({ ...single, radius }), 1e-12);
      expect(answer.massRate).toBeCloseToRelative(
        jeansRate({ ...single, radius }) * single.particleMass,
        1e-12,
      );
    });
  });

  it("of H at the Earth has λ 7.0318, an escape speed of 10771.4 m/s and w 8.1295 m/s", () => {
    const { escapeSpeed, gases } = thermalEscape(earth);
    expect(escapeSpeed).toAgreeWith({
      what: "escape speed at the Earth, 500 km",
      unit: "m s⁻¹",
      published: 10771.4,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(gases[0].escapeParameter).toAgreeWith({
      what: "escape parameter of H at the Earth's exobase, 500 km, 1000 K",
      unit: "1",
      published: 7.0318,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(gases[0].effusionVelocity).toAgreeWith({
      what: "effusion velocity of H at the Earth's exobase, 500 km, 1000 K",
      unit: "m s⁻¹",
      published: 8.1295,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(gases[0].thermalSpeed).toAgreeWith({
      what: "thermal speed of H at the Earth's exobase, 500 km, 1000 K",
      unit: "m s⁻¹",
      published: 4061.996,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it.each(jeansCases)("of $label has the independent program's velocity", (row) => {
    const input = { ...row, meanMass: row.particleMass, hillRadius: null };
    const { gases } = thermalEscape({
      ...input,
      gases: [{ formula: row.gas, mass: row.particleMass, logNumberDensity: 0 }],
    });
    const tolerance = 1e-12 * (1 + row.escapeParameter);
    expect(gases[0].effusionVelocity).toAgreeWith({
      what: "effusion velocities among all answers of an escape",
      unit: "m s⁻¹",
      published: row.effusionVelocity,
      within: { relative: tolerance },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(gases[0].jeansFlux).toAgreeWith({
      what: "Jeans fluxes of one particle a m³",
      unit: "m⁻² s⁻¹",
      published: row.effusionVelocity,
      within: { relative: tolerance },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("gives null for what no number holds, and its logarithm", () => {
    const heavy = { formula: "X", mass: (2000 / 7.0318) * (findGas("H")?.mass ?? NaN), logNumberDensity: 0 };
    const [x] = thermalEscape({ ...earth, gases: [heavy] }).gases;
    expect(x.escapeParameter).toBeCloseToRelative(2000, 1e-5);
    expect([x.effusionVelocity, x.jeansFlux, x.rate, x.massRate]).toEqual([null, null, null, null]);
    // 10^−86x: −2000 log10 e = −868.6, less than 10 powers from the rest.
    expect(x.log10EffusionVelocity).toBeGreaterThan(-870);
    expect(x.log10EffusionVelocity).toBeLessThan(-860);
    expect(x.log10Rate - x.log10JeansFlux).toBeCloseTo(Math.log10(4 * Math.PI * earth.radius ** 2), 10);
    expect(x.log10MassRate - x.log10Rate).toBeCloseTo(Math.log10(heavy.mass), 10);
  });

  it("takes a density that no number holds", () => {
    const trace = { ...gas("CO2", 1), logNumberDensity: -3000 };
    const [present] = thermalEscape({ ...earth, gases: [gas("CO2", 1)] }).gases;
    const [absent] = thermalEscape({ ...earth, gases: [trace] }).gases;
    expect(absent.jeansFlux).toBeNull();
    expect(absent.effusionVelocity).toBe(present.effusionVelocity);
    expect(absent.log10JeansFlux).toBeCloseTo(present.log10JeansFlux - 3000 * Math.log10(Math.E), 9);
  });

  it("takes the regime from the mean mass", () => {
    expect(thermalEscape(earth)).toMatchObject({ regime: "jeans", notes: [] });
    const light = thermalEscape({ ...earth, meanMass: findGas("H")?.mass ?? NaN, temperature: 1500 });
    expect(light.bulkEscapeParameter).toBeCloseToRelative(4.687885, 1e-5);
    expect(light.regime).toBe("jeans_estimate");
    expect(light.notes.map(({ code }) => code)).toEqual(["jeans_estimate"]);
  });

  it("tells a loosely bound gas what is published for it, and leaves the others alone", () => {
    const [h, he, o] = thermalEscape(earth).gases;
    expect(h.notes.map(({ level, code }) => [level, code])).toEqual([["remark", "jeans_correction_range"]]);
    expect(h.notes[0].message).toBe(
      "The escape parameter of H is 7.03. Below 15, published ratios of actual to Jeans escape are 0.7 to 0.75 for H at Earth (Brinkmann 1970); 0.7 to 0.8 for a light gas in a heavier one (Chamberlain and Campbell 1967); 1.4 to 1.7 for a single gas (Volkov et al. 2011).",
    );
    expect([he.notes, o.notes]).toEqual([[], []]);
    const [hotHelium] = thermalEscape({ ...earth, temperature: 2000, gases: [gas("He", 1)] }).gases;
    expect(hotHelium.notes[0].message).toContain("0.97 to 0.99 for He at Earth (Brinkmann 1970)");
    expect(hotHelium.notes[0].message).not.toContain("for H at Earth");
  });

  it("cautions where a gas drifts faster than a tenth of √(kT/m): below λ = 2.69", () => {
    // (1 + λ) e^{−λ}/√(2π) = 0.1 at λ = 2.69.
    const at = (lambda: number) => {
      const temperature = (1000 * 7.031828) / lambda;
      return thermalEscape({ ...earth, temperature, gases: [gas("H", 1)] }).gases[0].notes.map(
        ({ code }) => code,
      );
    };
    expect(at(2.67)).toContain("fast_drift");
    expect(at(2.71)).not.toContain("fast_drift");
  });

  it("cautions where the exobase lies beyond half the Hill radius", () => {
    const codes = (hillRadius: number | null) =>
      thermalEscape({ ...earth, hillRadius }).notes.map(({ code }) => code);
    expect(codes(1.99 * earth.radius)).toEqual(["exobase_near_hill_radius"]);
    expect(codes(2.01 * earth.radius)).toEqual([]);
    expect(codes(null)).toEqual([]);
  });

  it("keeps the order of the gases, and adds in proportion to their densities", () => {
    const density = fc.double({ min: -500, max: 60, noNaN: true });
    fc.assert(
      fc.property(density, density, (a, b) => {
        const one = { ...gas("H", 1), logNumberDensity: a };
        const two = { ...gas("O", 1), logNumberDensity: b };
        const [first, second] = thermalEscape({ ...earth, gases: [one, two] }).gases;
        const alone = thermalEscape({ ...earth, gases: [{ ...two, logNumberDensity: 0 }] }).gases[0];
        return (
          first.formula === "H" &&
          second.formula === "O" &&
          Math.abs(second.log10Rate - alone.log10Rate - b / Math.LN10) < 1e-12
        );
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    for (const key of [
      "gravitationalParameter",
      "radius",
      "temperature",
      "meanMass",
      "hillRadius",
    ] as const) {
      expect(() => thermalEscape({ ...earth, [key]: wrong })).toThrow(PhysicsDomainError);
    }
    expect(() => thermalEscape({ ...earth, gases: [{ ...gas("H", 1), mass: wrong }] })).toThrow(
      PhysicsDomainError,
    );
  });

  it("refuses a gas of no density, and names it", () => {
    expect(() => thermalEscape({ ...earth, gases: [gas("O2", 0)] })).toThrow(
      /number density of O2 is -Infinity/,
    );
  });
});
