import { describe, expect, it } from "vitest";

import { gravityAt, columnProblem } from "../../../../shared/physics/column/columnProblem";
import { setComposition } from "../../../../shared/physics/column/composition";
import { columnSlope, bindColumn } from "../../../../shared/physics/column/columnSlope";
import { logKnudsen, logKnudsenSlope } from "../../../../shared/physics/exobase/knudsen";
import "../../../toBeCloseToRelative";
import { sampleColumn } from "../column/sampleColumns";

const law = { isCapped: true, temperaturePiece: 0, eddyPiece: 0 };
const spinning = { angularSpeed: 2e-4, latitude: 0.3 };

describe.each([null, spinning])("the Knudsen number (rotation %#)", (centrifugal) => {
  const input = sampleColumn({ centrifugal });
  const problem = columnProblem(input);
  const state = problem.baseLogPressures.map((value, i) => value - 4 - i / 3);
  const height = 90e3;

  it("is the mean free path over the scale height, worked out by hand", () => {
    const pressures = [...state].map(Math.exp);
    const total = pressures.reduce((a, b) => a + b, 0);
    const mean = (value: (i: number) => number) =>
      pressures.reduce((sum, pressure, i) => sum + (pressure / total) * value(i), 0);
    const thermalEnergy = 1.380649e-23 * 180; // any temperature: it cancels
    const density = total / thermalEnergy;
    const free = 1 / (Math.SQRT2 * density * mean((i) => Math.PI * input.gases[i].collisionDiameter ** 2));
    const scaleHeight = thermalEnergy / (mean((i) => input.gases[i].mass) * gravityAt(problem, height));
    expect(logKnudsen(problem, height, state)).toBeCloseTo(Math.log(free / scaleHeight), 12);
  });

  it("has the slope that its differences show", () => {
    const slope = new Float64Array(state.length);
    bindColumn(problem, null, law);
    columnSlope(height, state, slope);
    const step = 1;
    const moved = (by: number) =>
      logKnudsen(
        problem,
        height + by,
        state.map((value, i) => value + by * slope[i]),
      );
    const measured = (moved(step) - moved(-step)) / (2 * step);
    setComposition(state, state.length);
    expect(logKnudsenSlope(problem, height, slope)).toBeCloseToRelative(measured, 1e-7);
  });

  it("counts gravity with the rotation taken off", () => {
    const r = 3.5e6 ** 2 / (3.5e6 - height);
    const spin = centrifugal ? 2e-4 * Math.cos(0.3) : 0;
    expect(gravityAt(problem, height)).toBeCloseToRelative(4.2e13 / r ** 2 - spin ** 2 * r, 1e-13);
  });
});
