import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { escapingColumn } from "../../../../shared/physics/coupling/escapingColumn";
import { guessExobase } from "../../../../shared/physics/coupling/guessExobase";
import { solveCoupledColumn } from "../../../../shared/physics/coupling/solveCoupledColumn";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import type { CoupledInput, CoupledOutcome } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { randomColumn } from "../column/randomColumn";
import { sampleCoupled, solved, warm } from "./coupledSamples";

function faultOf(input: CoupledInput): Extract<CoupledOutcome, { converged: false }> {
  const outcome = solveCoupledColumn(input);
  if (outcome.converged) throw new Error("It has an exobase.");
  expect(outcome.message).toMatch(/^[A-Z].*\.$/s);
  expect(outcome.largestKnudsen).toBeGreaterThan(0);
  expect(Number.isFinite(outcome.altitudeOfLargest)).toBe(true);
  return outcome;
}

const hydrogen = (temperature: number, given: Partial<CoupledInput> = {}) =>
  sampleCoupled({ fractions: { H: 1 }, temperature: { kind: "constant", temperature }, ...given });

describe("a coupled column without an exobase", () => {
  it("says that its base lies above it", () => {
    const fault = faultOf(sampleCoupled({ baseNumberDensity: 1e12 }));
    expect(fault).toMatchObject({ reason: "base_above_exobase", altitudeOfLargest: 100e3, marches: 0 });
    expect(fault.largestKnudsen).toBeGreaterThan(1);
  });

  it("says that its base is unbound, λ below 2", () => {
    // λ = GMm/(kTr): with m = 1 u and r = 3,500 km, 2 at 721.6 K.
    const fault = faultOf(hydrogen(730));
    expect(fault.reason).toBe("base_unbound");
    expect(fault.message).toContain("1.977");
    expect(solveCoupledColumn(hydrogen(715))).not.toMatchObject({ reason: "base_unbound" });
  });

  it("says how near it came where it runs away with or without escape", () => {
    const input = hydrogen(500, { baseNumberDensity: 1e22 });
    const open = solveColumn(input).exobase;
    if (open.found) throw new Error("It has none.");
    const { reason, message, largestKnudsen, altitudeOfLargest } = open;
    expect(faultOf(input)).toMatchObject({ reason, message, largestKnudsen, altitudeOfLargest });
  });

  it("says so where the fluxes fit only a place at which Kn falls", () => {
    const fractions = { CO2: 0.9, N2: 0.07, O: 0.03, H2: 1e-2, H: 1e-3 };
    const fault = faultOf(sampleCoupled({ temperature: warm, fractions }));
    expect(fault.reason).toBe("turn");
    expect(fault.message).toMatch(/no stationary hydrostatic exobase/);
  });

  it("names the criterion by which there is none", () => {
    const input = hydrogen(500, { baseNumberDensity: 1e22, criterion: { kind: "simple" } });
    expect(faultOf(input).message).toMatch(/^The Knudsen number without √2 never reaches 1/);
  });

  it("is continued by one that has an exobase as it is cooled", () => {
    const reasons = [300, 340, 380, 420, 460, 500].map((exosphere) => {
      const temperature = { ...warm, exosphere } as const;
      const fractions = { CO2: 0.9, N2: 0.07, O: 0.03, H2: 1e-2, H: 1e-3 };
      const outcome = solveCoupledColumn(
        sampleCoupled({ temperature, fractions, gravitationalParameter: 5e13 }),
      );
      return outcome.converged;
    });
    expect(reasons).toEqual([...reasons].sort((a, b) => Number(b) - Number(a)));
    expect(new Set(reasons).size).toBe(2);
  });
});

describe("an exobase that only escape makes", () => {
  it("is found where the column without flux runs away", () => {
    const input = sampleCoupled({
      temperature: warm,
      fractions: { CO2: 0.9, N2: 0.07, O: 0.03, H2: 1e-3, H: 1e-3 },
    });
    expect(solveColumn(input).exobase).toMatchObject({ found: false, reason: "runaway" });
    expect(solved(input).exobase.level.knudsen).toBeCloseToRelative(1, 1e-12);
  });
});

describe("an exobase that the guess misses", () => {
  // Ten gases, points of T and K: where weak escape has its exobase high and strong escape low, the guess lies between.
  const input: CoupledInput = { ...randomColumn(457), criterion: { kind: "bulk" }, corrections: {} };

  it("is found from that of stronger escape", () => {
    const { exobase, marches } = solved(input);
    expect(marches).toBeGreaterThan(20);
    const stronger = Object.fromEntries(input.gases.map(({ formula }) => [formula, 1.05]));
    const near = solved({ ...input, corrections: stronger });
    expect(near.marches).toBeLessThan(20);
    expect(exobase.level.altitude / near.exobase.level.altitude).toBeCloseTo(1, 1);
  });
});

describe("an exobase that the guess only comes near", () => {
  it("is found from where Kn is largest in the guess", () => {
    const input: CoupledInput = { ...randomColumn(750), criterion: { kind: "bulk" }, corrections: {} };
    const guess = guessExobase(escapingColumn(input));
    expect(guess.hasCrossing).toBe(false);
    expect(Math.exp(guess.largestLogNumber)).toBeCloseTo(0.97, 2);
    expect(solved(input).exobase.level.knudsen).toBeCloseToRelative(1, 1e-11);
  });
});

describe("an impossible coupling", () => {
  it.each([0, -1, NaN, Infinity])("is refused for a correction of %d", (factor) => {
    expect(() => solveCoupledColumn(sampleCoupled({ corrections: { H: factor } }))).toThrow(
      PhysicsDomainError,
    );
  });

  it("is refused for a correction or a criterion of a gas that is not there", () => {
    expect(() => solveCoupledColumn(sampleCoupled({ corrections: { Xe: 2 } }))).toThrow(/Xe.*CO2, N2/);
    const criterion = { kind: "gas", formula: "Xe" } as const;
    expect(() => solveCoupledColumn(sampleCoupled({ criterion }))).toThrow(/Xe.*CO2, N2/);
  });

  it.each([0, 1e-14, 0.1, NaN])("is refused for a tolerance of %d", (tolerance) => {
    expect(() => solveCoupledColumn(sampleCoupled(), tolerance)).toThrow(/tolerance/);
  });

  it("is refused for a column that is impossible itself", () => {
    expect(() => solveCoupledColumn(sampleCoupled({ baseNumberDensity: -1 }))).toThrow(PhysicsDomainError);
  });
});
