import { describe, expect, it } from "vitest";

import { escapingColumn } from "../../../../shared/physics/coupling/escapingColumn";
import { guessExobase } from "../../../../shared/physics/coupling/guessExobase";
import { downwardMarch, marchDown } from "../../../../shared/physics/coupling/marchDown";
import { altitudeOf } from "../../../../shared/physics/column/columnProblem";
import type { CoupledInput } from "../../../../shared/physics/types";
import { sampleCoupled, solved, warm } from "./coupledSamples";

/** The guess, and the largest residual of ln p at the base of a march down from it. */
function guessed(input: CoupledInput, accuracy?: number) {
  const column = escapingColumn(input);
  const guess = guessExobase(column, accuracy);
  const residual = marchDown(downwardMarch(column), guess.height, guess.state, 1e-10);
  return { guess, residual, altitude: altitudeOf(column.problem, guess.height) };
}

const traces = { CO2: 0.95, N2: 0.05, H: 1e-9, H2: 1e-8, He: 1e-8 };

describe("the guess of the exobase", () => {
  it.each([
    ["no K", { eddy: { kind: "none" } }],
    ["a constant K", { eddy: { kind: "constant", coefficient: 500 } }],
    ["a K with a ceiling", {}],
    ["a warmer gas", { temperature: warm }],
    ["points of T", { temperature: points() }],
    ["strong escape", { corrections: { H: 1e4, H2: 1e4, He: 1e4 } }],
  ] satisfies [string, Parameters<typeof sampleCoupled>[0]][])(
    "is exact for trace gases but for the errors of its march, with %s",
    (_, given) => {
      const input = sampleCoupled({ fractions: traces, ...given });
      const [usual, fine] = [guessed(input), guessed(input, 1e-7)];
      expect(usual.guess.hasCrossing).toBe(true);
      expect(usual.residual).toBeLessThan(1e-2);
      expect(fine.residual).toBeLessThan(1e-4);
    },
  );

  it("knows what is gone: the depletion of the solution", () => {
    const input = sampleCoupled({ fractions: traces, temperature: warm });
    const largest = Math.max(...solved(input).gases.map(({ supplyShare }) => supplyShare));
    expect(largest).toBeGreaterThan(0.5);
    expect(guessed(input).guess.largestDepletion).toBeCloseTo(largest, 2);
  });

  it("comes near where the light gases are no traces", () => {
    const input = sampleCoupled({ temperature: warm, fractions: { CO2: 0.9, O: 0.1, H2: 1e-3, H: 1e-3 } });
    const { residual, altitude } = guessed(input);
    expect(residual).toBeLessThan(0.2);
    expect(altitude / solved(input).exobase.level.altitude).toBeCloseTo(1, 1);
  });

  it("counts the drag of a heavy outflow on the others", () => {
    const input = sampleCoupled({
      temperature: warm,
      fractions: { CO2: 0.9, H2: 0.1 },
      gravitationalParameter: 2e14,
      corrections: { H2: 1e6 },
    });
    expect(guessed(input).residual).toBeLessThan(1);
  });

  it("finds none where the gas runs away, and tells how near it came", () => {
    const hot = { kind: "constant", temperature: 500 } as const;
    const { guess } = guessed(
      sampleCoupled({ fractions: { H: 1 }, temperature: hot, baseNumberDensity: 1e22 }),
    );
    expect(guess.hasCrossing).toBe(false);
    expect(guess.largestLogNumber).toBeLessThan(0);
  });
});

function points() {
  return {
    kind: "points",
    altitudes: Float64Array.of(90e3, 130e3, 150e3, 250e3),
    temperatures: Float64Array.of(140, 180, 170, 300),
  } as const;
}
