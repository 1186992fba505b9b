import { describe, expect, it } from "vitest";

import { emptyLevel, fillLevel } from "../../../../shared/physics/column/columnLevel";
import { columnProblem, gravityAt } from "../../../../shared/physics/column/columnProblem";
import { setComposition } from "../../../../shared/physics/column/composition";
import { bindColumn, columnSlope } from "../../../../shared/physics/column/columnSlope";
import { columnFactor } from "../../../../shared/physics/exobase/depthWeights";
import {
  exobaseNumber,
  logNumber,
  logNumberGradient,
  logNumberSlope,
} from "../../../../shared/physics/exobase/exobaseNumber";
import type { ExobaseCriterion } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { sampleColumn } from "../column/sampleColumns";

const law = { isCapped: true, temperaturePiece: 0, eddyPiece: 0 };
const spinning = { angularSpeed: 2e-4, latitude: 0.3 };
const boltzmann = 1.380649e-23; // CODATA 2022, exact
const criteria: ExobaseCriterion[] = [
  { kind: "bulk" },
  { kind: "simple" },
  { kind: "gas", formula: "CO2" },
  { kind: "gas", formula: "H" },
  { kind: "unit_depth" },
];
const cases = criteria.flatMap((criterion) =>
  [null, spinning].map((centrifugal) => ({
    name: `${Object.values(criterion).join(" ")}${centrifugal ? ", spinning" : ""}`,
    criterion,
    centrifugal,
  })),
);

describe.each(cases)("the number of an exobase: $name", ({ criterion, centrifugal }) => {
  const input = sampleColumn({ centrifugal });
  const problem = columnProblem(input);
  const number = exobaseNumber(problem, criterion);
  const state = problem.baseLogPressures.map((value, i) => value - 4 - i / 3);
  const height = 90e3;

  it("is what its definition says, worked out by hand", () => {
    const level = emptyLevel(input.gases.length);
    fillLevel(level, problem, law, height, state);
    const { gases } = input;
    const total = (each: (i: number) => number) => gases.reduce((sum, _, i) => sum + each(i), 0);
    const area = (i: number, j: number) =>
      Math.PI * ((gases[i].collisionDiameter + gases[j].collisionDiameter) / 2) ** 2;
    const n = level.numberDensities;
    const byHand = () => {
      if (criterion.kind === "bulk") return level.meanFreePath / level.scaleHeight;
      if (criterion.kind === "simple") return 1 / total((i) => n[i] * area(i, i)) / level.scaleHeight;
      if (criterion.kind === "gas") {
        const gas = gases.findIndex(({ formula }) => formula === criterion.formula);
        const collisions = total((j) => n[j] * area(gas, j) * Math.sqrt(1 + gases[gas].mass / gases[j].mass));
        return 1 / collisions / level.scaleHeights[gas];
      }
      const lambda = (i: number) => (4.2e13 * gases[i].mass) / (boltzmann * level.temperature * level.radius);
      return 1 / total((i) => n[i] * area(i, i) * level.scaleHeights[i] * columnFactor(lambda(i)));
    };
    expect(logNumber(number, height, law, state)).toBeCloseTo(Math.log(byHand()), 12);
  });

  it("has the derivatives that its differences show", () => {
    const byState = new Float64Array(state.length);
    const shift = 1e-5;
    state.forEach((_, i) => {
      const moved = (by: number) =>
        logNumber(
          number,
          height,
          law,
          state.map((value, j) => value + (i === j ? by : 0)),
        );
      const measured = (moved(shift) - moved(-shift)) / (2 * shift);
      setComposition(state, state.length);
      logNumberGradient(number, height, law, byState);
      expect(byState[i]).toBeCloseTo(measured, 9);
    });
  });

  it("has the slope that its differences show along the column", () => {
    const slope = new Float64Array(state.length);
    bindColumn(problem, null, law);
    columnSlope(height, state, slope);
    const step = 1;
    const moved = (by: number) =>
      logNumber(
        number,
        height + by,
        law,
        state.map((value, i) => value + by * slope[i]),
      );
    const measured = (moved(step) - moved(-step)) / (2 * step);
    setComposition(state, state.length);
    expect(logNumberSlope(number, height, law, slope)).toBeCloseToRelative(measured, 1e-7);
  });

  it("counts gravity with the rotation taken off", () => {
    const r = 3.5e6 ** 2 / (3.5e6 - height);
    const spin = centrifugal ? 2e-4 * Math.cos(0.3) : 0;
    expect(gravityAt(problem, height)).toBeCloseToRelative(4.2e13 / r ** 2 - spin ** 2 * r, 1e-13);
  });
});

describe("the number of one gas", () => {
  it("is refused for a gas that the column has not, and names those it has", () => {
    const problem = columnProblem(sampleColumn());
    expect(() => exobaseNumber(problem, { kind: "gas", formula: "Xe" })).toThrow(/Xe.*CO2, N2, Ar/);
  });

  it("is that of the bulk, of a gas alone", () => {
    const problem = columnProblem(sampleColumn({ fractions: { N2: 1 } }));
    const state = problem.baseLogPressures.map((value) => value - 12);
    const [bulk, gas] = [{ kind: "bulk" } as const, { kind: "gas", formula: "N2" } as const].map(
      (criterion) => logNumber(exobaseNumber(problem, criterion), 80e3, law, state),
    );
    expect(gas).toBeCloseTo(bulk, 13);
  });
});

describe("the column of a gas above a level, over nH", () => {
  /** ∫ exp(−λ(1 − r_c/r)) dr/H up to where the integrand is e⁻⁴⁰, by Simpson's rule; H = r_c/λ. */
  function byQuadrature(lambda: number): number {
    const [end, parts] = [40 / (lambda - 40), 40_000];
    let sum = 0;
    for (let k = 0; k <= parts; k += 1) {
      const x = (k * end) / parts; // r/r_c − 1
      const weight = k === 0 || k === parts ? 1 : k % 2 === 1 ? 4 : 2;
      sum += weight * Math.exp((-lambda * x) / (1 + x));
    }
    return (lambda * sum * end) / (3 * parts);
  }

  it.each([60, 100, 300])("is the hydrostatic integral at λ = %d", (lambda) => {
    expect(columnFactor(lambda)).toBeCloseToRelative(byQuadrature(lambda), 1e-9);
  });

  it("is its first terms, written out", () => {
    expect(columnFactor(1)).toBe(1);
    expect(columnFactor(2)).toBe(1);
    expect(columnFactor(2.5)).toBeCloseToRelative(1 + 0.5 * (2 / 2.5), 1e-15);
    const lambda = 4.25;
    const expected = 1 + 2 / lambda + 6 / lambda ** 2 + 0.25 * (24 / lambda ** 3);
    expect(columnFactor(lambda)).toBeCloseToRelative(expected, 1e-15);
  });

  it("never jumps", () => {
    for (let whole = 2; whole < 40; whole += 1) {
      expect(columnFactor(whole)).toBeCloseTo(columnFactor(whole - 1e-9), 8);
    }
  });

  it("tends to 1 as the gas becomes more tightly bound", () => {
    const values = [10, 30, 100, 1e3, 1e6].map(columnFactor);
    expect(values).toEqual([...values].sort((a, b) => b - a));
    expect(values[4]).toBeCloseToRelative(1, 3e-6);
  });
});
