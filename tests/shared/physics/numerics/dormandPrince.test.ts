import "../../../toBeCloseToRelative";

import { describe, expect, it } from "vitest";
import {
  denseCoefficients,
  denseRows,
  end,
  finishStep,
  interpolateStep,
  k1,
  k13,
  keepStages,
  keptStages,
  restoreStages,
  start,
  takeStep,
  type Slope,
} from "../../../../shared/physics/numerics/dormandPrince";
import * as tableau from "../../../../shared/physics/numerics/dormandPrinceTableau";

const coefficient = (name: string): number => (tableau as Record<string, number>)[name] ?? 0;
const stages = Array.from({ length: 12 }, (_, i) => i + 1);
const node = (i: number) => (i === 1 ? 0 : coefficient(`c${i}`));
const sumOver = (f: (i: number) => number) => stages.reduce((sum, i) => sum + f(i), 0);

/** y″ = −y, whose solution is known, with a slope that also depends on x. */
const swing: Slope = (x, [y, v], slope) => {
  slope[0] = v + Math.cos(3 * x);
  slope[1] = -y;
};
/** Its solution from y(0) = 1, v(0) = 0. */
const swung = (x: number): [number, number] => [
  Math.cos(x) - Math.sin(x) / 8 + (3 / 8) * Math.sin(3 * x),
  -Math.sin(x) - Math.cos(x) / 8 + Math.cos(3 * x) / 8,
];

/** The largest error at the end of so many equal steps. */
function errorAfter(steps: number, length: number): number {
  start.set(swung(0));
  const step = length / steps;
  for (let i = 0; i < steps; i += 1) {
    swing(i * step, start, k1);
    takeStep(swing, 2, i * step, step);
    start.set(end);
  }
  const [y, v] = swung(length);
  return Math.max(Math.abs(end[0] - y), Math.abs(end[1] - v));
}

/** The largest error of the dense output within one step from 0. */
function denseError(step: number): number {
  start.set(swung(0));
  swing(0, start, k1);
  takeStep(swing, 2, 0, step);
  finishStep(swing, 0, step);
  const coefficients = new Float64Array(2 * denseRows);
  denseCoefficients(swing, 2, 0, step, coefficients, 0);
  const out = new Float64Array(2);
  let largest = 0;
  for (let part = 1; part < 20; part += 1) {
    interpolateStep(coefficients, 0, 2, start, 0, part / 20, out);
    const [y, v] = swung((part / 20) * step);
    largest = Math.max(largest, Math.abs(out[0] - y), Math.abs(out[1] - v));
  }
  return largest;
}

describe("the tableau", () => {
  it.each(stages.slice(1))("gives stage %i weights that add up to its node", (i) => {
    const sum = sumOver((j) => coefficient(`a${i}_${j}`));
    expect(Math.abs(sum - node(i))).toBeLessThan(1e-14);
  });

  it.each([0, 1, 2, 3, 4, 5, 6, 7])("integrates x^%i exactly", (power) => {
    expect(sumOver((i) => coefficient(`b${i}`) * node(i) ** power)).toBeCloseTo(1 / (power + 1), 13);
  });

  it.each([0, 1, 2, 3, 4, 5])("meets the order condition Σ bᵢ aᵢⱼ cⱼ^%i", (power) => {
    const sum = sumOver(
      (i) => coefficient(`b${i}`) * sumOver((j) => coefficient(`a${i}_${j}`) * node(j) ** power),
    );
    expect(sum).toBeCloseTo(1 / ((power + 1) * (power + 2)), 13);
  });

  it("has error weights that vanish on a constant slope", () => {
    expect(Math.abs(sumOver((i) => coefficient(`fifth${i}`)))).toBeLessThan(1e-15);
    expect(Math.abs(sumOver((i) => coefficient(`third${i}`)))).toBeLessThan(1e-14);
  });
});

describe("a step", () => {
  it("is of order 8: halving it divides the error by about 2⁸", () => {
    const order = Math.log2(errorAfter(8, 4) / errorAfter(16, 4));
    expect(order).toBeGreaterThan(7.5);
    expect(order).toBeLessThan(9.5);
  });

  it("estimates an error that is larger than the true one, and of order 8", () => {
    const estimates = [0.4, 0.2].map((step) => {
      start.set(swung(0));
      swing(0, start, k1);
      const estimate = takeStep(swing, 2, 0, step);
      const [y, v] = swung(step);
      expect(estimate).toBeGreaterThan(Math.max(Math.abs(end[0] - y), Math.abs(end[1] - v)));
      return estimate;
    });
    expect(Math.log2(estimates[0] / estimates[1])).toBeGreaterThan(7);
  });

  it("runs downward as well as upward", () => {
    start.set(swung(2));
    swing(2, start, k1);
    takeStep(swing, 2, 2, -0.1);
    expect(end[0]).toBeCloseTo(swung(1.9)[0], 12);
    expect(end[1]).toBeCloseTo(swung(1.9)[1], 12);
  });

  it("has no error on a constant slope", () => {
    const constant: Slope = (_, __, slope) => slope.fill(2, 0, 2);
    start.fill(1, 0, 2);
    k1.fill(2, 0, 2);
    expect(takeStep(constant, 2, 0, 3)).toBeLessThan(1e-14);
    expect(end[0]).toBeCloseToRelative(7, 1e-15);
  });

  it("says NaN where a stage leaves the domain", () => {
    const root: Slope = (x, _, slope) => slope.fill(Math.sqrt(1 - x), 0, 1);
    start.fill(0, 0, 1);
    k1.fill(1, 0, 1);
    expect(takeStep(root, 1, 0, 2)).toBeNaN();
  });
});

describe("the dense output", () => {
  it("is of order 7: halving the step divides its error by about 2⁸", () => {
    const order = Math.log2(denseError(0.5) / denseError(0.25));
    expect(order).toBeGreaterThan(7.2);
    expect(order).toBeLessThan(9.5);
  });

  it("meets the step at both ends", () => {
    start.set(swung(0));
    swing(0, start, k1);
    takeStep(swing, 2, 0, 0.7);
    finishStep(swing, 0, 0.7);
    const coefficients = new Float64Array(2 * denseRows);
    denseCoefficients(swing, 2, 0, 0.7, coefficients, 0);
    const out = new Float64Array(2);
    interpolateStep(coefficients, 0, 2, start, 0, 0, out);
    expect([...out]).toEqual([start[0], start[1]]);
    interpolateStep(coefficients, 0, 2, start, 0, 1, out);
    expect(out[0]).toBeCloseTo(end[0], 15);
    expect(out[1]).toBeCloseTo(end[1], 15);
  });

  it("can be made later from the stages that were kept", () => {
    start.set(swung(0));
    swing(0, start, k1);
    takeStep(swing, 2, 0, 0.5);
    finishStep(swing, 0, 0.5);
    const kept = new Float64Array(2 * keptStages);
    keepStages(2, kept, 0);
    const ends = [start.slice(), end.slice()];
    const atOnce = new Float64Array(2 * denseRows);
    denseCoefficients(swing, 2, 0, 0.5, atOnce, 0);

    errorAfter(3, 1);
    start.set(ends[0]);
    end.set(ends[1]);
    restoreStages(2, kept, 0);
    const later = new Float64Array(2 * denseRows);
    denseCoefficients(swing, 2, 0, 0.5, later, 0);
    expect([...later]).toEqual([...atOnce]);
    expect([...k13.slice(0, 2)]).toEqual([...kept.slice(16, 18)]);
  });
});
