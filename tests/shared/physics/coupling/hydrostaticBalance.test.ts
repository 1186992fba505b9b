import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { solveCoupledColumn } from "../../../../shared/physics/coupling/solveCoupledColumn";
import type { Column } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { randomColumn } from "../column/randomColumn";

/** ∫ m̄ n g dz between two altitudes by Simpson's rule, from what levels say of mass, density and gravity. */
function weightBetween(column: Column, lower: number, upper: number): number {
  const parts = 200;
  const step = (upper - lower) / parts;
  let sum = 0;
  for (let k = 0; k <= parts; k += 1) {
    const { meanMass, numberDensity, gravity } = column.levelAt(k === parts ? upper : lower + k * step);
    sum += (k === 0 || k === parts ? 1 : k % 2 === 1 ? 4 : 2) * meanMass * numberDensity * gravity;
  }
  return (sum * step) / 3;
}

/** Pressure differences over two scale heights from each altitude against the weight between; the step is 0.01 H. */
function expectBalance(column: Column, altitudes: readonly number[], seed: number): void {
  for (const lower of altitudes) {
    const from = column.levelAt(lower);
    const upper = Math.min(lower + 2 * from.scaleHeight, column.topAltitude);
    const borne = from.pressure - column.levelAt(upper).pressure;
    if (borne < 0.1 * from.pressure) continue;
    expect(weightBetween(column, lower, upper), `seed ${seed} at ${lower}`).toBeCloseToRelative(borne, 1e-6);
  }
}

describe("the pressure of a column", { timeout: 60_000 }, () => {
  // Points of T and K have kinks, at which Simpson's rule loses digits.
  const seeds = Array.from({ length: 120 }, (_, k) => 60_000 + k).filter((seed) => {
    const { temperature, eddy } = randomColumn(seed);
    return temperature.kind !== "points" && eddy.kind !== "points";
  });

  it("bears the weight of the gas above, without flux", () => {
    for (const seed of seeds.slice(0, 40)) {
      const column = solveColumn(randomColumn(seed));
      const { baseAltitude } = column.input;
      const reach = column.topAltitude - baseAltitude;
      expectBalance(
        column,
        [0, 0.2, 0.5, 0.8].map((share) => baseAltitude + share * reach),
        seed,
      );
    }
  });

  it("bears it with escape, below the exobase and above", () => {
    let solved = 0;
    for (const seed of seeds.slice(0, 60)) {
      const outcome = solveCoupledColumn({
        ...randomColumn(seed),
        criterion: { kind: "bulk" },
        corrections: {},
      });
      if (!outcome.converged) continue;
      solved += 1;
      const { column, exobase } = outcome;
      const { baseAltitude } = column.input;
      const edge = exobase.level.altitude;
      const below = [0, 0.3, 0.6].map((share) => baseAltitude + share * (edge - baseAltitude));
      // A given top may end below the exobase.
      const inside = [...below, edge].filter((altitude) => altitude < column.topAltitude);
      expectBalance(column, inside, seed);
    }
    expect(solved).toBeGreaterThan(20);
  });
});
