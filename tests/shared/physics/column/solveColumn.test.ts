import { describe, expect, it } from "vitest";

import { diffusionCoefficient } from "../../../../shared/physics/column/diffusionCoefficient";
import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import type { ColumnInput } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { numbersOf, verdictOf } from "./columnAnswers";
import { randomColumn } from "./randomColumn";
import { altitudesBetween, sampleColumn } from "./sampleColumns";

describe("solveColumn on random planets", { timeout: 60_000 }, () => {
  const seeds = Array.from({ length: 200 }, (_, k) => 20_000 + k);

  it("answers with finite numbers, or says why there is no exobase, every time", () => {
    const verdicts = new Map<string, number>();
    for (const seed of seeds) {
      const column = solveColumn(randomColumn(seed));
      const odd = numbersOf(column).find((value) => !Number.isFinite(value));
      expect(odd, `seed ${seed}`).toBeUndefined();
      verdicts.set(verdictOf(column), (verdicts.get(verdictOf(column)) ?? 0) + 1);
    }
    expect([...verdicts.keys()].sort()).toEqual(["base_unbound", "found", "runaway", "top_below_exobase"]);
  });

  it("does not depend on its steps: half the tolerance moves no number by 1e-6", () => {
    for (const seed of seeds.slice(0, 100)) {
      const input = randomColumn(seed);
      const [column, finer] = [solveColumn(input), solveColumn(input, 5e-11)];
      expect(verdictOf(finer), `seed ${seed}`).toBe(verdictOf(column));
      const expected = numbersOf(finer);
      numbersOf(column).forEach((value, k) => {
        // A density that is itself next to nothing (below 1e-100) may move by more.
        if (Math.abs(value) > 1e-100)
          expect(value, `seed ${seed}, number ${k}`).toBeCloseToRelative(expected[k], 1e-6);
      });
    }
  });

  it("never lets a mean free path pass its scale height below the exobase without naming it", () => {
    for (const seed of seeds.slice(0, 100)) {
      const column = solveColumn(randomColumn(seed));
      const { exobase } = column;
      if (!exobase.found || exobase.otherAltitudes.length > 0) continue;
      const base = column.input.baseAltitude;
      for (const altitude of altitudesBetween(base, exobase.level.altitude - 1, 12)) {
        expect(column.levelAt(altitude).knudsen, `seed ${seed}`).toBeLessThan(1);
      }
    }
  });
});

describe("solveColumn", () => {
  it("is deterministic to the last bit", () => {
    expect(numbersOf(solveColumn(sampleColumn()))).toEqual(numbersOf(solveColumn(sampleColumn())));
  });

  it("takes twelve gases with collision parameters of every exponent", () => {
    const fractions = {
      CO2: 1,
      N2: 0.1,
      Ar: 0.1,
      CO: 0.1,
      O2: 0.01,
      O: 0.01,
      H2: 1e-5,
      H: 1e-6,
      He: 1e-5,
      Ne: 1e-6,
    };
    const input = sampleColumn({ fractions: { ...fractions, D: 1e-9, CH4: 1e-7 } });
    const column = solveColumn(input);
    expect(column.exobase.found).toBe(true);
    expect(column.homopauses.every((homopause) => homopause.found)).toBe(true);
  });

  it("lands on a table of 300 knots without losing a step", () => {
    const altitudes = altitudesBetween(100e3, 250e3, 300);
    const temperatures = altitudes.map((z) => 200 + 60 * Math.sin(z / 9e3));
    const column = solveColumn(
      sampleColumn({ temperature: { kind: "points", altitudes, temperatures }, top: 260e3 }),
    );
    expect(numbersOf(column).every(Number.isFinite)).toBe(true);
    const coarse = solveColumn(column.input, 1e-8);
    expect(coarse.levelAt(250e3).pressure).toBeCloseToRelative(column.levelAt(250e3).pressure, 1e-7);
  });

  it("finds the same column from a higher base that was read off a lower one", () => {
    const lower = solveColumn(sampleColumn({ eddy: { kind: "constant", coefficient: 1000 } }));
    const level = lower.levelAt(140e3);
    const gases = lower.input.gases.map((gas, i) => ({ ...gas, moleFraction: level.moleFractions[i] }));
    const upper = solveColumn({
      ...lower.input,
      gases,
      baseAltitude: 140e3,
      baseNumberDensity: level.numberDensity,
    });
    const [a, b] = [lower.levelAt(210e3), upper.levelAt(210e3)];
    a.logNumberDensities.forEach((value, i) => expect(b.logNumberDensities[i]).toBeCloseTo(value, 8));
    if (!lower.exobase.found || !upper.exobase.found) throw new Error("Both columns have an exobase.");
    expect(upper.exobase.level.altitude).toBeCloseToRelative(lower.exobase.level.altitude, 1e-9);
  });

  it("counts its evaluations", () => {
    const { evaluations } = solveColumn(sampleColumn());
    expect(evaluations).toBeGreaterThan(200);
    expect(solveColumn(sampleColumn(), 1e-6).evaluations).toBeLessThan(evaluations);
  });
});

describe("the top of a column", () => {
  it("is the one asked for", () => {
    expect(solveColumn(sampleColumn({ top: 345_678.9 })).topAltitude).toBe(345_678.9);
  });

  it("is 2.3 times as high as the exobase if left open, and above Kn = 10", () => {
    const column = solveColumn(sampleColumn({ fractions: { CO2: 1, N2: 0.1 } }));
    if (!column.exobase.found) throw new Error("The column has an exobase.");
    expect(column.topAltitude).toBeCloseToRelative(2.3 * column.exobase.level.altitude, 1e-12);
    expect(column.levelAt(column.topAltitude).knudsen).toBeGreaterThan(10);
  });

  it("is raised to Kn = 10 where that lies higher", () => {
    const column = solveColumn(sampleColumn({ fractions: { CO2: 0.99, O: 0.01, H2: 1e-5 } }));
    if (!column.exobase.found) throw new Error("The column has an exobase.");
    expect(column.topAltitude).toBe(column.exobase.upper);
    expect(column.levelAt(column.topAltitude).knudsen).toBeCloseToRelative(10, 1e-9);
  });

  it("is lowered, with a caution, where the gas has long ended", () => {
    const cold = { kind: "constant", temperature: 20 } as const;
    const column = solveColumn(sampleColumn({ fractions: { CO2: 1 }, temperature: cold, top: 3000e3 }));
    expect(column.topAltitude).toBeLessThan(2500e3);
    expect(column.levelAt(column.topAltitude).pressure).toBeCloseToRelative(1e-280, 1e-6);
    expect(column.notes.map((note) => note.code)).toEqual(["column_cut_short"]);
  });

  it("stays below where the rotation carries the gas", () => {
    const centrifugal = { angularSpeed: 8e-4, latitude: 0 };
    const column = solveColumn(
      sampleColumn({ centrifugal, temperature: { kind: "constant", temperature: 900 } }),
    );
    expect(column.levelAt(column.topAltitude).gravity).toBeGreaterThan(0);
    expect(() => solveColumn(sampleColumn({ centrifugal, top: 5000e3 }))).toThrow(
      /centrifugal term cancels gravity/,
    );
  });
});

describe("points that end inside the column", () => {
  const altitudes = Float64Array.of(110e3, 150e3, 190e3);
  const temperature = { kind: "points", altitudes, temperatures: Float64Array.of(150, 200, 250) } as const;
  const eddy = { kind: "points", altitudes, coefficients: Float64Array.of(100, 800, 400) } as const;

  it("are held constant beyond, with a caution that names both ranges", () => {
    const column = solveColumn(sampleColumn({ temperature, eddy, top: 300e3 }));
    expect(column.levelAt(102e3).temperature).toBe(150);
    expect(column.levelAt(299e3).temperature).toBe(250);
    expect(column.levelAt(299e3).eddyCoefficient).toBeCloseToRelative(400, 1e-13);
    expect(column.notes.map((note) => note.code)).toEqual(["temperature_extrapolated", "eddy_extrapolated"]);
    expect(column.notes[0]).toMatchObject({ level: "caution" });
    expect(column.notes[0].message).toContain("from 110 km to 190 km, the column from 100 km to 300 km");
  });

  it("say nothing where they cover the column", () => {
    const wide = { ...temperature, altitudes: Float64Array.of(100e3, 200e3, 300e3) };
    expect(solveColumn(sampleColumn({ temperature: wide, top: 300e3 })).notes).toEqual([]);
  });
});

describe("the homopause", () => {
  it("is where D by Blanc's law is K, for main gases too", () => {
    const column = solveColumn(sampleColumn());
    column.homopauses.forEach((homopause, i) => {
      if (!homopause.found) throw new Error("Every gas has a homopause.");
      const level = column.levelAt(homopause.altitude);
      expect(diffusionCoefficient(column.input, level, i)).toBeCloseToRelative(level.eddyCoefficient, 1e-9);
    });
  });

  it("is told for a gas that is absent", () => {
    const column = solveColumn(sampleColumn({ fractions: { CO2: 0.9, O: 0.1, He: 0 } }));
    const homopause = column.homopauses[2];
    if (!homopause.found) throw new Error("Helium would have a homopause.");
    const level = column.levelAt(homopause.altitude);
    expect(diffusionCoefficient(column.input, level, 2)).toBeCloseToRelative(level.eddyCoefficient, 1e-9);
  });

  it.each([
    ["no_eddy_mixing", sampleColumn({ eddy: { kind: "none" } })],
    ["no_eddy_mixing", sampleColumn({ eddy: { kind: "constant", coefficient: 0 } })],
    ["single_gas", sampleColumn({ fractions: { N2: 1 } })],
    ["mixed_throughout", sampleColumn({ eddy: { kind: "constant", coefficient: 1e12 }, top: 200e3 })],
    ["separated_throughout", sampleColumn({ eddy: { kind: "constant", coefficient: 1e-3 } })],
  ] as [string, ColumnInput][])("is left out because of %s", (reason, input) => {
    for (const homopause of solveColumn(input).homopauses)
      expect(homopause).toEqual({ found: false, reason });
  });

  it("is the last of several, with a caution", () => {
    const eddy = {
      kind: "points",
      altitudes: Float64Array.of(100e3, 120e3, 140e3, 170e3),
      coefficients: Float64Array.of(1e3, 1e-1, 1e6, 1e3),
    } as const;
    const column = solveColumn(sampleColumn({ fractions: { N2: 0.99, Ar: 0.01 }, eddy, top: 250e3 }));
    const homopause = column.homopauses[1];
    expect(homopause.found && homopause.altitude).toBeGreaterThan(140e3);
    expect(column.notes.map((note) => note.code)).toContain("several_homopauses");
  });

  it("is found for a gas so abundant that all others are nothing", () => {
    const eddy = { kind: "constant", coefficient: 1e3 } as const;
    // The other gas is so rare that its share of the whole is 0 in numbers wherever it separates.
    const fractions = { H2: 1, CO2: 1e-323 };
    const column = solveColumn(sampleColumn({ fractions, eddy, top: 1500e3 }));
    const [light, heavy] = column.homopauses;
    if (!light.found || !heavy.found) throw new Error("Both have one.");
    // In a mixture of two, both diffuse through each other with the same coefficient.
    expect(light.altitude).toBeCloseToRelative(heavy.altitude, 1e-10);
  });
});

describe("what no column can be", () => {
  const gases = sampleColumn({ fractions: { CO2: 0.9, O: 0.1 } }).gases;
  const parameters = sampleColumn({ fractions: { CO2: 0.9, O: 0.1 } }).collisionParameters;
  const points = (altitudes: number[], values: number[]) => ({
    kind: "points" as const,
    altitudes: Float64Array.from(altitudes),
    temperatures: Float64Array.from(values),
    coefficients: Float64Array.from(values),
  });

  it.each([
    ["gravitational parameter", { gravitationalParameter: 0 }],
    ["radius", { radius: -1 }],
    ["base altitude", { baseAltitude: NaN }],
    ["distance of the base from the centre", { baseAltitude: -4e6 }],
    ["number density at the base", { baseNumberDensity: 0 }],
    ["number of gases", { gases: [], collisionParameters: [] }],
    ["mass of CO2", { gases: [{ ...gases[0], mass: 0 }, gases[1]], collisionParameters: parameters }],
    [
      "collision diameter of O",
      { gases: [gases[0], { ...gases[1], collisionDiameter: -1 }], collisionParameters: parameters },
    ],
    [
      "thermal diffusion factor of O",
      { gases: [gases[0], { ...gases[1], thermalDiffusionFactor: NaN }], collisionParameters: parameters },
    ],
    [
      "mole fraction of O",
      { gases: [gases[0], { ...gases[1], moleFraction: -0.1 }], collisionParameters: parameters },
    ],
    [
      "sum of the mole fractions",
      { gases: [gases[0], { ...gases[1], moleFraction: 0.2 }], collisionParameters: parameters },
    ],
    ["number of rows of collision parameters", { gases, collisionParameters: [] }],
    [
      "collision parameter of O in CO2",
      {
        gases,
        collisionParameters: [
          [parameters[0][0], parameters[0][1]],
          [{ ...parameters[1][0], coefficient: 0 }, parameters[1][1]],
        ],
      },
    ],
    [
      "collision parameter of O in CO2",
      {
        gases,
        collisionParameters: [[parameters[0][0], { ...parameters[0][1], coefficient: 1 }], parameters[1]],
      },
    ],
    ["temperature", { temperature: { kind: "constant", temperature: 0 } }],
    [
      "temperature of the exosphere",
      { temperature: { kind: "bates", base: 100, exosphere: -1, shape: 1e-5, referenceAltitude: 0 } },
    ],
    [
      "shape of the temperature profile",
      { temperature: { kind: "bates", base: 100, exosphere: 200, shape: 0, referenceAltitude: 0 } },
    ],
    [
      "temperature at the base",
      { temperature: { kind: "bates", base: 100, exosphere: 1000, shape: 1e-4, referenceAltitude: 130e3 } },
    ],
    ["altitudes of the temperature", { temperature: points([1e5, 1e5], [100, 200]) }],
    ["temperature", { temperature: points([1e5, 2e5], [100, -200]) }],
    ["number of altitudes of the temperature", { temperature: points([1e5], []) }],
    ["eddy coefficient", { eddy: { kind: "constant", coefficient: -1 } }],
    ["eddy coefficient", { eddy: points([1e5, 2e5], [100, 0]) }],
    ["ceiling of the eddy coefficient", { eddy: { kind: "power", base: 1, exponent: 1, ceiling: 0 } }],
    ["top of the column", { top: 100e3 }],
    ["angular speed", { centrifugal: { angularSpeed: NaN, latitude: 0 } }],
    ["centrifugal part of gravity at the base", { centrifugal: { angularSpeed: 0.1, latitude: 0 } }],
  ] as [string, Partial<ColumnInput>][])("is refused by its %s", (quantity, given) => {
    const refused = () => solveColumn(sampleColumn(given));
    expect(refused).toThrow(PhysicsDomainError);
    try {
      refused();
    } catch (error) {
      expect((error as PhysicsDomainError).quantity).toBe(quantity);
    }
  });

  it.each([0, 0.1, NaN])("cannot be solved to a tolerance of %d", (tolerance) => {
    expect(() => solveColumn(sampleColumn(), tolerance)).toThrow(/tolerance/);
  });
});
