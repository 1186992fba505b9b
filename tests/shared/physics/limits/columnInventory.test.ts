import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { columnInventory } from "../../../../shared/physics/limits/columnInventory";
import "../../../toBeCloseToRelative";
import { baseGravity, eightGases, sampleColumn } from "../column/sampleColumns";

const seed = 20261201;
const column = solveColumn(sampleColumn());
const gasOf = (formula: string): number => Object.keys(eightGases).indexOf(formula);

/** 4π ∫ n r² dz by the midpoint rule. */
function bySteps(gas: number, from: number, to: number, parts = 4000): number {
  let sum = 0;
  for (let i = 0; i < parts; i += 1) {
    const level = column.levelAt(from + ((to - from) * (i + 0.5)) / parts);
    sum += level.numberDensities[gas] * level.radius ** 2 * ((to - from) / parts);
  }
  return 4 * Math.PI * sum;
}

describe("columnInventory", () => {
  it.each(["CO2", "O", "H"])("of %s is the sum over thin shells", (formula) => {
    const [{ particles }] = columnInventory(column, [gasOf(formula)], 100e3, 220e3);
    expect(particles).toBeCloseToRelative(bySteps(gasOf(formula), 100e3, 220e3), 2e-6);
  });

  it("of a whole atmosphere is its base pressure over m g, over the sphere", () => {
    // 1 bar of CO2 on Mars is 26,825 kg/m² (p/g); here the column's own p and g. Wider
    // shells and weaker gravity higher up add 4H/r, and more of the next order.
    const cold = solveColumn(
      sampleColumn({
        fractions: { CO2: 1 },
        temperature: { kind: "constant", temperature: 30 },
        eddy: { kind: "none" },
      }),
    );
    const { mass } = cold.input.gases[0];
    const base = cold.levelAt(100e3);
    const expected = (base.pressure / (mass * base.gravity)) * 4 * Math.PI * base.radius ** 2;
    const [{ particles }] = columnInventory(cold, [0], 100e3, cold.topAltitude);
    const thinness = base.scaleHeight / base.radius;
    expect(particles).toBeCloseToRelative(expected * (1 + 4 * thinness), 30 * thinness ** 2);
  });

  it("of a thin shell is n 4πr² times its depth", () => {
    const gas = gasOf("O");
    const level = column.levelAt(150e3);
    const [{ particles }] = columnInventory(column, [gas], 150e3, 150e3 + 1e-2);
    expect(particles).toBeCloseToRelative(
      level.numberDensities[gas] * 4 * Math.PI * level.radius ** 2 * 1e-2,
      1e-5,
    );
  });

  // 1e-9 where the column is smooth, 1e-6 across the kink where eddy mixing meets its ceiling.
  it.each([
    ["smooth", solveColumn(sampleColumn({ eddy: { kind: "constant", coefficient: 200 } })), 1e-9],
    ["with a kink", column, 1e-6],
  ] as const)("is the same for gases together and one by one, %s", (_, solved, tolerance) => {
    const gases = [0, gasOf("O"), gasOf("H")];
    columnInventory(solved, gases, 100e3, 220e3).forEach(({ particles }, i) => {
      const [alone] = columnInventory(solved, [gases[i]], 100e3, 220e3);
      expect(particles).toBeCloseToRelative(alone.particles!, tolerance);
    });
  });

  it("adds up over pieces", () => {
    const cut = fc.double({ min: 101e3, max: 219e3, noNaN: true });
    fc.assert(
      fc.property(cut, (z) => {
        const parts = columnInventory(column, [0], 100e3, z)[0].particles ?? 0;
        const rest = columnInventory(column, [0], z, 220e3)[0].particles ?? 0;
        const whole = columnInventory(column, [0], 100e3, 220e3)[0].particles ?? 0;
        return Math.abs((parts + rest) / whole - 1) < 1e-8;
      }),
      { seed, numRuns: 20 },
    );
  });

  it("holds in logarithms what no number holds", () => {
    const input = sampleColumn({ fractions: { CO2: 1, H: 1e-340 + 1e-310 } });
    const [{ logParticles }] = columnInventory(solveColumn(input), [1], 100e3, 200e3);
    expect(logParticles).toBeLessThan(-500);
    expect(baseGravity(input)).toBeGreaterThan(boltzmann.value);
  });

  it.each([100e3, 99e3, NaN, Infinity])("refuses to end at %s m", (to) => {
    expect(() => columnInventory(column, [0], 100e3, to)).toThrow(PhysicsDomainError);
  });

  it("refuses a gas that is not there", () => {
    const without = solveColumn(sampleColumn({ fractions: { CO2: 1, H: 0 } }));
    expect(() => columnInventory(without, [1], 100e3, 150e3)).toThrow(PhysicsDomainError);
  });
});
