import { describe, expect, it } from "vitest";

import { escapingColumn } from "../../../../shared/physics/coupling/escapingColumn";
import { guessExobase } from "../../../../shared/physics/coupling/guessExobase";
import { downwardMarch, marchDown } from "../../../../shared/physics/coupling/marchDown";
import { marchJacobian } from "../../../../shared/physics/coupling/marchJacobian";
import type { CoupledInput } from "../../../../shared/physics/types";
import { sampleCoupled, warm } from "./coupledSamples";

const cases: [string, CoupledInput][] = [
  ["K with a ceiling and traces", sampleCoupled({ temperature: warm })],
  [
    "K that falls from its ceiling",
    sampleCoupled({ eddy: { kind: "power", base: 1e6, exponent: -0.7, ceiling: 3e4 } }),
  ],
  ["no K", sampleCoupled({ temperature: warm, eddy: { kind: "none" } })],
  [
    "light gases that are no traces and drag the others",
    sampleCoupled({ temperature: warm, fractions: { CO2: 0.9, O: 0.1, H2: 1e-3, H: 1e-3 } }),
  ],
];

describe("how the base depends on the exobase", () => {
  it.each(cases)("is what differences of marches show, with %s", (_, input) => {
    const column = escapingColumn(input);
    const { height, state } = guessExobase(column);
    const down = downwardMarch(column);
    const size = state.length;
    const columns = size + 1;
    const residualOf = (by: number, k: number) => {
      const changed = state.map((value, i) => value + (i === k ? by : 0));
      marchDown(down, height + (k === size ? by * 1e4 : 0), changed, 1e-12);
      return down.residual.slice();
    };
    marchDown(down, height, state, 1e-6);
    const jacobian = new Float64Array(size * columns);
    marchJacobian(down, jacobian);
    for (let k = 0; k < columns; k += 1) {
      const [lower, upper] = [residualOf(-1e-4, k), residualOf(1e-4, k)];
      for (let i = 0; i < size; i += 1) {
        const measured = (upper[i] - lower[i]) / 2e-4;
        const carried = jacobian[i * columns + k] * (k === size ? 1e4 : 1);
        expect(Math.abs(carried - measured), `gas ${i} by ${k}`).toBeLessThan(3e-3);
      }
    }
  });

  it("is the identity for a trace gas, however much of it escapes", () => {
    const input = sampleCoupled({ fractions: { N2: 1, H: 1e-12 }, corrections: { H: 1e3 } });
    const column = escapingColumn(input);
    const { height, state } = guessExobase(column);
    const down = downwardMarch(column);
    marchDown(down, height, state, 1e-8);
    const jacobian = new Float64Array(6);
    marchJacobian(down, jacobian);
    expect(jacobian[4]).toBeCloseTo(1, 6);
    expect(jacobian[1]).toBeCloseTo(0, 6);
  });
});
