import { describe, expect, it } from "vitest";

import { altitudeOf } from "../../../../shared/physics/column/columnProblem";
import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import {
  fluxSlopes,
  logFluxes,
  logVelocities,
  setFluxes,
  velocitySlopes,
} from "../../../../shared/physics/coupling/escapeFluxes";
import { escapingColumn } from "../../../../shared/physics/coupling/escapingColumn";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { logEffusionVelocity } from "../../../../shared/physics/escape/logEffusionVelocity";
import { temperatureAt } from "../../../../shared/physics/temperature/temperatureAt";
import "../../../toBeCloseToRelative";
import { sampleCoupled, warm } from "./coupledSamples";

describe("what escapes from a height", () => {
  const input = sampleCoupled({ temperature: warm, corrections: { H: 0.7 } });
  const column = escapingColumn(input);
  const state = Float64Array.from(column.problem.baseLogPressures, (value) => value - 9);
  const height = 30e3;

  it("is the Jeans flux with its correction, referred to the area of the base", () => {
    setFluxes(column, height, 0, state);
    const altitude = altitudeOf(column.problem, height);
    const radius = input.radius + altitude;
    const temperature = temperatureAt(warm, altitude, input.radius);
    const { gravitationalParameter } = input;
    input.gases.forEach(({ formula, mass: particleMass }, i) => {
      const lambda = escapeParameter({ gravitationalParameter, radius, temperature, particleMass });
      const logVelocity =
        logEffusionVelocity({ temperature, particleMass, escapeParameter: lambda }) +
        Math.log(formula === "H" ? 0.7 : 1) +
        2 * Math.log(radius / 3.5e6);
      expect(logVelocities[i]).toBeCloseToRelative(logVelocity, 1e-13);
      const logDensity = state[i] - Math.log(boltzmann.value * temperature);
      expect(logFluxes[i]).toBeCloseTo(logDensity + logVelocity, 11);
    });
  });

  it("has the slopes that differences show where T rises", () => {
    const valuesAt = (by: number) => {
      setFluxes(column, height + by, 0, state);
      return [...logVelocities, ...logFluxes];
    };
    const [lower, upper] = [valuesAt(-1), valuesAt(1)];
    setFluxes(column, height, 0, state);
    [...velocitySlopes, ...fluxSlopes].forEach((slope, k) => {
      if (slope !== 0) expect(slope).toBeCloseToRelative((upper[k] - lower[k]) / 2, 1e-6);
    });
  });
});
