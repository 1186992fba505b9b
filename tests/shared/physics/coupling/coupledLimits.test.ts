import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { effusionVelocity } from "../../../../shared/physics/escape/effusionVelocity";
import { columnDiffusionLimit } from "../../../../shared/physics/limits/columnDiffusionLimit";
import type { CoupledInput, EddyProfile, TemperatureProfile } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { altitudesBetween } from "../column/sampleColumns";
import { numbersOf, sampleCoupled, solved, warm, type Solved } from "./coupledSamples";

const trace = 1e-12;

/**
 * Flux at the exobase of a trace of H in N2, from the column without flux by the closed form (Chamberlain and Hunten
 * 1987, chapter 7, for the limit; derived anew from the equation of a trace gas):
 *
 *   Φ = w n_F/(1 + w n_F I),   I = ∫ (r_c/r)² dz/[(D + K) n_F],   by Simpson's rule
 */
function closedForm(input: CoupledInput, correction = 1): { flux: number; depletion: number } {
  const column = solveColumn(input);
  if (!column.exobase.found) throw new Error(column.exobase.message);
  const { level } = column.exobase;
  const { temperature, radius } = level;
  const particleMass = input.gases[1].mass;
  const { gravitationalParameter } = input;
  const lambda = escapeParameter({ gravitationalParameter, radius, temperature, particleMass });
  const velocity = correction * effusionVelocity({ temperature, particleMass, escapeParameter: lambda });
  const { coefficient, exponent } = input.collisionParameters[0][1];
  const parts = 4000;
  const step = (level.altitude - input.baseAltitude) / parts;
  let integral = 0;
  altitudesBetween(input.baseAltitude, level.altitude, parts + 1).forEach((altitude, k) => {
    const at = column.levelAt(altitude);
    const diffusion = (coefficient * at.temperature ** exponent) / at.numberDensity;
    const weight = k === 0 || k === parts ? 1 : k % 2 === 1 ? 4 : 2;
    const area = (radius / at.radius) ** 2;
    integral += (weight * step * area) / (3 * (diffusion + at.eddyCoefficient) * at.numberDensities[1]);
  });
  const density = level.numberDensities[1];
  return {
    flux: (velocity * density) / (1 + velocity * density * integral),
    depletion: velocity * density * integral,
  };
}

const ofN2 = (given: Parameters<typeof sampleCoupled>[0] = {}) =>
  sampleCoupled({
    fractions: { N2: 1, H: trace },
    temperature: { kind: "constant", temperature: 250 },
    ...given,
  });

const isothermal = (temperature: number): TemperatureProfile => ({ kind: "constant", temperature });
const mixings: Record<string, EddyProfile> = {
  "no K": { kind: "none" },
  "a constant K": { kind: "constant", coefficient: 300 },
  "a K that grows to its ceiling": { kind: "power", base: 50, exponent: 0.5, ceiling: 3000 },
};

describe("a trace gas in a fixed background", () => {
  const cases = Object.entries(mixings).flatMap(([name, eddy]) =>
    [isothermal(120), isothermal(250), isothermal(450), warm].map((temperature) => ({
      name: `${name}, ${temperature.kind === "constant" ? `${temperature.temperature} K` : "warming"}`,
      input: ofN2({ eddy, temperature }),
    })),
  );

  it.each(cases)("escapes at the rate of the closed form, with $name", ({ input }) => {
    const { flux, depletion } = closedForm(input);
    const gas = solved(input).gases[1];
    expect(Math.exp(gas.logFlux)).toBeCloseToRelative(flux, 1e-6);
    expect(gas.supplyShare).toBeCloseToRelative(depletion / (1 + depletion), 1e-6);
  });

  it.each([1e-3, 0.7, 30, 1e6])("does so with its escape corrected by %d", (correction) => {
    const input = ofN2({ corrections: { H: correction } });
    const { flux } = closedForm(input, correction);
    const gas = solved(input).gases[1];
    expect(Math.exp(gas.logFlux)).toBeCloseToRelative(flux, 1e-6);
    expect(Math.exp(gas.logFlux - gas.logJeansFlux)).toBeCloseToRelative(correction, 1e-12);
  });

  it("leaves no mark on the background", () => {
    const [coupled, open] = [solved(ofN2()), solveColumn(ofN2())];
    if (!open.exobase.found) throw new Error(open.exobase.message);
    expect(coupled.exobase.level.altitude).toBeCloseToRelative(open.exobase.level.altitude, 1e-7);
  });
});

describe("the three regimes of escape", () => {
  /** The flux that diffusion through the others can supply, at the exobase. */
  const supplyOf = (gas: number, { column, exobase }: Solved) => {
    const limit = columnDiffusionLimit(column, gas, exobase.level.radius);
    if (!limit.exists) throw new Error(`Gas ${gas} has no limit: ${limit.reason}.`);
    return limit.flux;
  };
  const share = ({ gases }: Solved) => gases[gases.length - 1].supplyShare;

  it("is the Jeans flux of the open column where little leaves", () => {
    const input = ofN2({ corrections: { H: 1e-10 } });
    const coupled = solved(input);
    const open = solveColumn(input).exobaseBy({ kind: "bulk" });
    if (!open.found) throw new Error(open.message);
    expect(share(coupled)).toBeLessThan(1e-6);
    expect(coupled.exobase.level.logNumberDensities[1]).toBeCloseTo(open.level.logNumberDensities[1], 6);
  });

  /**
   * Without K and thermal diffusion the supply is exactly 1/I at infinity, Hunten's limit at the base (Hunten 1973),
   * and a share exp(−(1/H_a − 1/H_i) h) of it less at a finite height.
   */
  it("is Hunten's limit by diffusion where all leaves that comes", () => {
    const gases = ofN2().gases.map((gas) => ({ ...gas, thermalDiffusionFactor: 0 }));
    const input = ofN2({ eddy: { kind: "none" }, gases, corrections: { H: 1e9 } });
    const coupled = solved(input);
    const weight = (gas: number) => (input.gases[gas].mass * 4.2e13) / (3.5e6 ** 2 * boltzmann.value * 250);
    const { altitude, radius } = coupled.exobase.level;
    const height = ((altitude - 100e3) * 3.5e6) / radius;
    const finite = 1 - Math.exp(-(weight(0) - weight(1)) * height);
    expect(share(coupled)).toBeGreaterThan(0.999_999);
    expect(Math.exp(coupled.gases[1].logFlux) * finite).toBeCloseToRelative(supplyOf(1, coupled), 1e-6);
  });

  it("stays below that limit where the gas is no trace at the exobase, and near it", () => {
    const input = sampleCoupled({
      temperature: warm,
      fractions: { CO2: 0.9, N2: 0.07, O: 0.03, H2: 1e-3, H: 1e-3 },
    });
    const coupled = solved(input);
    expect(coupled.exobase.level.moleFractions[3]).toBeGreaterThan(0.2);
    const ratio = Math.exp(coupled.gases[3].logFlux) / supplyOf(3, coupled);
    expect(ratio).toBeGreaterThan(0.8);
    expect(ratio).toBeLessThan(1.1);
  });

  it("passes from one to the other as escape grows stronger", () => {
    const runs = [1e-10, 1e-8, 1e-2, 1, 1e2, 1e4].map((H) => solved(ofN2({ corrections: { H } })));
    const shares = runs.map(share);
    const rates = runs.map(({ gases }) => gases[1].logRate);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(rates).toEqual([...rates].sort((a, b) => a - b));
    expect(rates[1] - rates[0]).toBeCloseTo(Math.log(100), 4);
    expect(rates[5] - rates[4]).toBeLessThan(0.01);
    expect(runs[5].notes).toContainEqual(
      expect.objectContaining({ level: "remark", code: "supply_limited" }),
    );
    expect(runs[0].notes).toEqual([]);
  });
});

describe("escape too weak to matter", () => {
  const cold = sampleCoupled({ temperature: isothermal(60), gravitationalParameter: 4e14 });

  it("leaves the very column without flux", () => {
    const coupled = solved(cold);
    const open = solveColumn(cold);
    expect(coupled.exobase).toEqual(open.exobase);
    expect(coupled.marches).toBe(1);
    for (const altitude of [100e3, 120e3, open.topAltitude]) {
      expect(coupled.column.levelAt(altitude)).toEqual(open.levelAt(altitude));
    }
    expect(coupled.gases.every(({ supplyShare }) => supplyShare === 0)).toBe(true);
    expect(coupled.gases.every(({ logRate }) => Number.isFinite(logRate))).toBe(true);
  });

  it("has its exobase even above a given top, with a caution", () => {
    const low = solved({ ...cold, top: 101e3 });
    expect(low.exobase.level.altitude).toBeCloseToRelative(solved(cold).exobase.level.altitude, 1e-12);
    expect(low.notes.map(({ code }) => code)).toEqual(["exobase_above_top"]);
    expect(low.column.topAltitude).toBe(101e3);
  });

  it("is joined without a step: just above the limit, the answer is the same", () => {
    const depletion = (correction: number) =>
      ofN2({ temperature: isothermal(120), corrections: { H: correction } });
    const weaker = [1e-9, 1e-10, 1e-11, 1e-12, 1e-13].map((correction) => solved(depletion(correction)));
    const isOpen = weaker.map(({ marches }) => marches === 1);
    expect(new Set(isOpen).size).toBe(2);
    const last = numbersOf(weaker[4]).slice(0, 7);
    for (const run of weaker) {
      numbersOf(run)
        .slice(0, 7)
        .forEach((value, k) => expect(value).toBeCloseToRelative(last[k], 1e-8));
    }
  });
});

describe("a gas alone", () => {
  it("escapes as from the column without flux, however much that is", () => {
    const input = sampleCoupled({ fractions: { N2: 1 }, temperature: isothermal(900) });
    const coupled = solved(input);
    expect(coupled.exobase).toEqual(solveColumn(input).exobase);
    expect(coupled.gases[0].supplyShare).toBe(0);
  });
});

describe("several exobases", () => {
  // Hydrogen, an eighth as wide and 40 times as light, takes over from argon near Kn = 1.
  const separated = (H: number) =>
    sampleCoupled({
      fractions: { Ar: 1, H },
      eddy: { kind: "none" },
      temperature: isothermal(120),
      baseNumberDensity: 1e18,
      corrections: { H: 1e-7 },
    });

  it("are the last one before Kn = 10 and the others, as without flux", () => {
    let seen = 0;
    for (let exponent = -7; exponent <= -3; exponent += 0.25) {
      const input = separated(10 ** exponent);
      const open = solveColumn(input).exobase;
      if (!open.found) continue;
      const { exobase, marches } = solved(input);
      expect(exobase.level.altitude).toBeCloseToRelative(open.level.altitude, 1e-3);
      expect(exobase.otherAltitudes.length).toBe(open.otherAltitudes.length);
      exobase.otherAltitudes.forEach((altitude, k) =>
        expect(altitude).toBeCloseToRelative(open.otherAltitudes[k], 1e-3),
      );
      if (exobase.otherAltitudes.length > 0 && marches > 1) {
        seen += 1;
        expect(exobase.notes).toMatchObject([{ level: "caution", code: "several_exobases" }]);
      }
    }
    expect(seen).toBeGreaterThan(0);
  });
});
