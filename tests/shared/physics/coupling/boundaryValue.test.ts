import { describe, expect, it } from "vitest";

import type { CoupledInput } from "../../../../shared/physics/types";
import { collocate } from "./collocation";
import { sampleCoupled, solved, warm } from "./coupledSamples";

const cases: [string, CoupledInput][] = [
  [
    "hydrogen that is no trace at the exobase, with a constant K",
    sampleCoupled({
      temperature: warm,
      eddy: { kind: "constant", coefficient: 800 },
      fractions: { CO2: 0.9, O: 0.1, H2: 1e-3 },
      baseNumberDensity: 1e18,
    }),
  ],
  [
    "two light gases that drag each other, without K, isothermal, one escaping more easily than Jeans has it",
    sampleCoupled({
      temperature: { kind: "constant", temperature: 300 },
      eddy: { kind: "none" },
      fractions: { N2: 0.99, He: 0.01, H: 1e-3 },
      baseNumberDensity: 1e17,
      corrections: { H: 1.5 },
    }),
  ],
];

describe("the coupled column as a boundary-value problem", { timeout: 60_000 }, () => {
  it.each(cases)("has the same solution by collocation: %s", (_, input) => {
    const shot = solved(input);
    // Newton's method sets out a little off, so that it has to find the solution itself.
    const start = shot.exobase.level.altitude * 1.02;
    const guess = (z: number) =>
      [...shot.column.levelAt(z).logNumberDensities].map((value, i) => value - i * 0.05);
    const [coarse, fine] = [150, 300].map((intervals) => collocate(input, start, intervals, guess));
    // Its error falls with the fourth power of the interval; what is left after that is 0.23 m of 1,215 km, and less.
    const exact = (a: number, b: number) => b + (b - a) / 15;
    expect(coarse.altitude).not.toBe(fine.altitude);
    expect(Math.abs(exact(coarse.altitude, fine.altitude) - shot.exobase.level.altitude)).toBeLessThan(0.5);
    shot.gases.forEach(({ logRate }, i) => {
      const expected = exact(coarse.logRates[i], fine.logRates[i]);
      expect(Math.abs(logRate - expected), `rate of gas ${i}`).toBeLessThan(2e-6);
    });
  });
});
