import { describe, expect, it } from "vitest";

import { jeansFlux } from "../../../../shared/physics/escape/jeansFlux";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import type { CoupledInput } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { altitudesBetween, sampleColumn } from "../column/sampleColumns";
import { gradient } from "../column/slowColumn";
import { sampleCoupled, solved, warm } from "./coupledSamples";

const points = {
  kind: "points",
  altitudes: Float64Array.of(80e3, 120e3, 135e3, 180e3, 240e3),
  temperatures: Float64Array.of(160, 140, 190, 360, 400),
} as const;
const heavy = { CO2: 0.9, N2: 0.07, O: 0.03 };

const samples: [string, CoupledInput][] = [
  ["eight gases and a K with a ceiling", sampleCoupled({ temperature: warm })],
  ["a constant K", sampleCoupled({ temperature: warm, eddy: { kind: "constant", coefficient: 2e3 } })],
  ["no K", sampleCoupled({ temperature: warm, eddy: { kind: "none" }, fractions: { ...heavy, H2: 1e-4 } })],
  [
    "light gases that are a third of the exobase",
    sampleCoupled({ temperature: warm, fractions: { ...heavy, H2: 1e-3, H: 1e-3 } }),
  ],
  [
    "light gases that are all of the exobase",
    sampleCoupled({ temperature: warm, fractions: { ...heavy, H2: 1e-2 }, gravitationalParameter: 7e13 }),
  ],
  ["points of T", sampleCoupled({ temperature: points })],
  [
    "a light main gas",
    sampleCoupled({ fractions: { H2: 0.85, He: 0.14, CH4: 0.01 }, gravitationalParameter: 2e14 }),
  ],
];

describe.each(samples)("the coupled column with %s", (_, input) => {
  const { column, exobase, gases } = solved(input);
  const rates = gases.map(({ logRate }) => Math.exp(logRate));
  const { altitude: edge } = exobase.level;
  const knots = input.temperature.kind === "points" ? [...input.temperature.altitudes] : [];
  const logs = (z: number) => [...column.levelAt(z).logNumberDensities];

  /** By differences of the fourth order, against the equations written anew. */
  function expectEquations(z: number, withRates: readonly number[]): void {
    const step = 250;
    if (knots.some((knot) => Math.abs(knot - z) < 2 * step)) return;
    const [a, b, c, d] = [z - 2 * step, z - step, z + step, z + 2 * step].map(logs);
    const expected = gradient(input, z, logs(z), withRates);
    const size = Math.max(...expected.map(Math.abs));
    expected.forEach((slope, i) => {
      const measured = (8 * (c[i] - b[i]) - (d[i] - a[i])) / (12 * step);
      expect(Math.abs(measured - slope), `gas ${i} at ${z}`).toBeLessThan(2e-7 * size);
    });
  }

  it("carries each gas at one rate through every altitude up to the exobase", () => {
    for (const z of altitudesBetween(input.baseAltitude + 1e3, edge - 1e3, 15)) expectEquations(z, rates);
  });

  it("is hydrostatic without flux above it", () => {
    for (const z of altitudesBetween(edge + 1e3, Math.min(edge + 300e3, column.topAltitude - 1e3), 7)) {
      expectEquations(z, []);
    }
  });

  it("lets go at the exobase what its density there gives", () => {
    const { level } = exobase;
    input.gases.forEach(({ formula, mass: particleMass }, i) => {
      const place = { gravitationalParameter: input.gravitationalParameter, radius: level.radius };
      const lambda = escapeParameter({ ...place, temperature: level.temperature, particleMass });
      const { temperature } = level;
      const flux = jeansFlux({
        numberDensity: level.numberDensities[i],
        temperature,
        particleMass,
        escapeParameter: lambda,
      });
      expect(gases[i].formula).toBe(formula);
      expect(Math.exp(gases[i].logFlux)).toBeCloseToRelative(flux, 1e-10);
      expect(Math.exp(gases[i].logRate)).toBeCloseToRelative(4 * Math.PI * level.radius ** 2 * flux, 1e-10);
    });
  });

  it("stands on the base that was given", () => {
    const base = column.levelAt(input.baseAltitude);
    expect(base.numberDensity).toBeCloseToRelative(input.baseNumberDensity, 1e-8);
    input.gases.forEach(({ moleFraction }, i) =>
      expect(base.moleFractions[i]).toBeCloseToRelative(moleFraction, 2e-8),
    );
  });

  it("has Kn = 1 at its exobase, and no jump there", () => {
    expect(exobase.level.knudsen).toBeCloseToRelative(1, 1e-12);
    const [below, above] = [-1e-3, 1e-3].map((shift) => logs(edge + shift));
    below.forEach((value, i) => expect(Math.abs(above[i] - value)).toBeLessThan(1e-6));
    logs(edge).forEach((value, i) => expect(value).toBeCloseTo(exobase.level.logNumberDensities[i], 11));
    expect(column.exobase).toBe(exobase);
  });

  it("has the band of its own Knudsen number", () => {
    expect(column.levelAt(exobase.lower ?? NaN).knudsen).toBeCloseToRelative(0.1, 1e-11);
    const { upper } = exobase;
    if (upper !== null) expect(column.levelAt(upper).knudsen).toBeCloseToRelative(10, 1e-11);
    // Where light gases are much of the exobase, Kn turns before it gets there.
    else expect(Math.min(...exobase.level.moleFractions.slice(3))).toBeGreaterThan(0.02);
  });
});

describe("the rest of a coupled column", () => {
  it("ends where it was asked to, or at 2.3 times its exobase", () => {
    expect(solved(sampleCoupled({ top: 345_678.9 })).column.topAltitude).toBe(345_678.9);
    const { column, exobase } = solved(sampleCoupled({ temperature: warm }));
    expect(column.topAltitude).toBeCloseToRelative(2.3 * exobase.level.altitude, 1e-12);
  });

  it("may end below its exobase, with a caution", () => {
    const whole = solved(sampleCoupled({ temperature: warm }));
    const cut = solved(sampleCoupled({ temperature: warm, top: 150e3 }));
    expect(cut.exobase.level.altitude).toBeCloseToRelative(whole.exobase.level.altitude, 1e-10);
    expect(cut.notes).toContainEqual(
      expect.objectContaining({ level: "caution", code: "exobase_above_top" }),
    );
    expect(cut.exobase.upper).toBeNull();
    expect(() => cut.column.levelAt(151e3)).toThrow(/within the column/);
    expect(cut.column.levelAt(150e3)).toEqual(whole.column.levelAt(150e3));
  });

  it("is the same in profiles, and stays so when others are solved", () => {
    const { column, exobase } = solved(sampleCoupled({ temperature: warm }));
    const altitudes = [110e3, 180e3, exobase.level.altitude, exobase.level.altitude + 50e3];
    const before = altitudes.map((z) => column.levelAt(z));
    solved(sampleCoupled({ fractions: { H2: 0.9, He: 0.1 }, gravitationalParameter: 2e14 }));
    expect(altitudes.map((z) => column.levelAt(z))).toEqual(before);
    const profiles = column.profilesAt(Float64Array.from(altitudes));
    before.forEach((level, k) => expect(profiles.gases[7].numberDensity[k]).toBe(level.numberDensities[7]));
  });

  it("keeps absent gases absent", () => {
    const { gases } = solved(sampleCoupled({ fractions: { CO2: 0.9, He: 0, O: 0.1, H: 1e-6, D: 0 } }));
    const absent = { logFlux: -Infinity, logJeansFlux: -Infinity, logRate: -Infinity, supplyShare: 0 };
    expect(gases[1]).toEqual({ formula: "He", ...absent });
    expect(gases[4]).toEqual({ formula: "D", ...absent });
    expect(gases[3].logRate).toBeGreaterThan(0);
  });

  it("has the homopauses of the depleted mixture, where D = K", () => {
    const input = sampleCoupled({ temperature: warm });
    const { column } = solved(input);
    const homopause = column.homopauses[7];
    if (!homopause.found) throw new Error("H has a homopause.");
    const level = column.levelAt(homopause.altitude);
    const resistance = input.gases.reduce((sum, _, j) => {
      if (j === 7) return sum;
      const { coefficient, exponent } = input.collisionParameters[7][j];
      return sum + level.moleFractions[j] / (coefficient * level.temperature ** exponent);
    }, 0);
    const diffusion = (1 - level.moleFractions[7]) / (resistance * level.numberDensity);
    expect(diffusion).toBeCloseToRelative(level.eddyCoefficient, 1e-9);
    expect(sampleColumn().gases[7].formula).toBe("H");
  });
});
